/** Styles and attributes that exist only on the web, typed for React Native's components. */
import type { TextStyle, ViewStyle } from 'react-native';

/** Style properties that react-native-web passes on and React Native's types do not name. */
export function webStyle(style: Record<string, string | number>): ViewStyle {
  return style;
}

/** The same for text: the web's types of the two do not fit each other. */
export function webTextStyle(style: Record<string, string | number>): TextStyle {
  return style;
}

/** Attributes (`data-…`, events) that react-native-web passes on and React Native's types do not name. */
export function webProps(props: Record<string, unknown>): object {
  return props;
}
