import { SignedInScreen } from '@/shared/ui/screens/shell/SignedInScreen';

export default function SignedInLayout() {
  return <SignedInScreen />;
}
