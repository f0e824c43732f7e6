import { SettingsScreen } from '@/shared/ui/screens/workshop/SettingsScreen';

export default function Settings() {
  return <SettingsScreen />;
}
