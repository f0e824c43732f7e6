import { Link } from 'expo-router';
import { Text, View } from 'react-native';

export default function NotFound() {
  return (
    <View role="main">
      <Text role="heading">No such page</Text>
      <Link href="/">To the Bench</Link>
    </View>
  );
}
