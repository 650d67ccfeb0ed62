import { createContext, type ReactNode, use } from 'react';
import { Text as NativeText, type TextStyle } from 'react-native';
import { type ColourName, type FontSize, fontSizes, fonts } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { webProps } from './web-props.ts';

export interface TextProps {
  children: ReactNode;
  size?: FontSize;
  tone?: ColourName;
  strong?: boolean;
  /** Set in Mono: figures, identifiers, columns of numbers. */
  figures?: boolean;
  align?: 'left' | 'right' | 'center';
  lines?: number;
  id?: string;
  /** Read out when it changes. */
  live?: boolean;
  /** Not read out: it repeats what a label already says. */
  silent?: boolean;
}

const InsideText = createContext(false);

/** All words on the screen. Inside another Text it keeps that one's look, except for what is given. */
export function Text({ children, size, tone, strong, figures, align, lines, id, live, silent }: TextProps) {
  const colours = useColours();
  const inside = use(InsideText);
  const style: TextStyle = inside ? {} : { ...textStyle(size ?? 'body', figures), color: colours[tone ?? 'ink'] };
  if (inside && size) Object.assign(style, textStyle(size, figures));
  if (inside && tone) style.color = colours[tone];
  if (!inside || figures || strong) style.fontFamily = fontOf(figures, strong);
  if (align) style.textAlign = align;
  const web = webProps({ id, 'aria-live': live ? 'polite' : undefined, 'aria-hidden': silent || undefined });
  return (
    <NativeText style={style} {...(lines ? { numberOfLines: lines } : {})} {...web}>
      <InsideText value={true}>{children}</InsideText>
    </NativeText>
  );
}

export interface HeadingProps {
  children: ReactNode;
  level: 1 | 2 | 3 | 4;
  size?: FontSize;
  id?: string;
  tone?: ColourName;
}

const headingSizes: Record<HeadingProps['level'], FontSize> = { 1: 'title', 2: 'heading', 3: 'lead', 4: 'body' };

/** A real h1…h4. A page has one h1, which Page sets. */
export function Heading({ children, level, size, id, tone = 'ink' }: HeadingProps) {
  const colours = useColours();
  const fontSize = fontSizes[size ?? headingSizes[level]];
  const style: TextStyle = { fontFamily: fonts.textStrong, fontSize, lineHeight: Math.round(fontSize * 1.2), color: colours[tone] };
  return (
    <NativeText role="heading" style={style} {...webProps({ 'aria-level': level, id })}>
      <InsideText value={true}>{children}</InsideText>
    </NativeText>
  );
}

/** The symbol of a quantity (ξ, λ², η, T), in the italic of print. */
export function QuantitySymbol({ children }: { children: string }) {
  return <NativeText style={{ fontFamily: fonts.symbol }}>{children}</NativeText>;
}

function textStyle(size: FontSize, figures = false): TextStyle {
  const fontSize = fontSizes[size];
  // Figures stand in rows and columns of their own; text runs over lines.
  return { fontSize, lineHeight: Math.round(fontSize * (figures || fontSize > 22 ? 1.15 : 1.4)) };
}

function fontOf(figures = false, strong = false): string {
  if (figures) return strong ? fonts.figuresStrong : fonts.figures;
  return strong ? fonts.textStrong : fonts.text;
}
