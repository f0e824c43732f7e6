import { useLocalSearchParams } from 'expo-router';

import { SignInScreen } from '@/shared/ui/screens/sign-in/SignInScreen';

export default function SignIn() {
  const { from, expired } = useLocalSearchParams();
  return <SignInScreen from={from} expired={expired === '1'} />;
}
