/**
 * Attributes that React Native Web passes on to the page and React Native's types do not know
 * (aria-describedby, aria-invalid, href, tabIndex on text). Spread the result into the element.
 */
export function webProps(props: Record<string, unknown>): object {
  return props;
}
