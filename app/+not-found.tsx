import { NotFoundScreen } from '@/shared/ui/screens/notFound/NotFoundScreen';

export default function NotFound() {
  return <NotFoundScreen />;
}
