import { Link as RouterLink } from 'expo-router';
import type { ReactNode } from 'react';
import { type FontSize, fontSizes, fonts } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { useTargetSize } from './target-size.tsx';

export interface LinkProps {
  href: string;
  children: ReactNode;
  size?: FontSize;
  strong?: boolean;
  /** Runs within a sentence: no taller than its line. */
  inline?: boolean;
  /** Leaves the app or fetches a file: the browser follows it itself. */
  download?: boolean;
}

/** Goes somewhere; what does something is a Button. */
export function Link({ href, children, size = 'body', strong, inline, download }: LinkProps) {
  const colours = useColours();
  const target = useTargetSize();
  const fontSize = fontSizes[size];
  const tall = { lineHeight: target, display: 'flex' } as const;
  const style = {
    color: colours.verdigris,
    fontFamily: strong ? fonts.textStrong : fonts.text,
    textDecorationLine: 'underline' as const,
    ...(inline ? {} : tall),
    fontSize,
  };
  if (download) {
    return (
      <a
        href={href}
        download
        style={{ ...style, display: inline ? 'inline' : 'inline-block', lineHeight: inline ? undefined : `${target}px` }}
      >
        {children}
      </a>
    );
  }
  return (
    <RouterLink href={href as '/'} style={style}>
      {children}
    </RouterLink>
  );
}
