import { NotFoundScreen } from '@/shared/ui/screens/parts/NotFoundScreen';

export default function NotFound() {
  return <NotFoundScreen />;
}
