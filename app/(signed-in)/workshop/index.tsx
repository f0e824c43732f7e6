import { WorkshopScreen } from '@/shared/ui/screens/workshop/WorkshopScreen';

export default function Workshop() {
  return <WorkshopScreen />;
}
