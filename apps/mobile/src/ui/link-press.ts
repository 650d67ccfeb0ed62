import { useRouter } from 'expo-router';
import type { GestureResponderEvent } from 'react-native';
import { webProps } from './web-props.ts';

/**
 * Makes a Pressable a real link: an address that can be copied or opened in another tab, and no page load when it is just pressed.
 * (The router's own Link drops a style that depends on the state of its child.)
 */
export function useLinkPress(href: string | undefined): { onPress?: (event: GestureResponderEvent) => void } {
  const router = useRouter();
  if (href === undefined) return {};
  const onPress = (event: GestureResponderEvent) => {
    const click = event as unknown as MouseEvent;
    if (click.metaKey || click.ctrlKey || click.shiftKey || click.altKey || (click.button ?? 0) !== 0) return;
    event.preventDefault();
    router.push(href as '/');
  };
  return { onPress, ...webProps({ href }) };
}
