import { AccountScreen } from '@/shared/ui/screens/workshop/AccountScreen';

export default function Account() {
  return <AccountScreen />;
}
