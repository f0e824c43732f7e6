import { PeopleScreen } from '@/shared/ui/screens/workshop/PeopleScreen';

export default function People() {
  return <PeopleScreen />;
}
