import type { Figure as FigureData, Mark, Stroke, TextFont } from '@strandnote/core/drawing';
import Svg, { Circle, Line, Path, Rect, Text as SvgText } from 'react-native-svg';
import { type Colours, fonts } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';

const families: Record<TextFont, string> = {
  text: fonts.text,
  'text-strong': fonts.textStrong,
  figures: fonts.figures,
  symbol: fonts.symbol,
};

/** Draws a display list of core/drawing. It is silent: whoever shows it says in words what it shows. */
export function Figure({ figure }: { figure: FigureData }) {
  const colours = useColours();
  if (figure.width <= 0 || figure.height <= 0) return null;
  return (
    <Svg width={figure.width} height={figure.height} viewBox={`0 0 ${figure.width} ${figure.height}`} aria-hidden>
      {figure.marks.map((mark, index) => (
        // A display list is drawn whole each time: a mark has no name but its place.
        // biome-ignore lint/suspicious/noArrayIndexKey: see above
        <MarkView key={index} mark={mark} colours={colours} />
      ))}
    </Svg>
  );
}

function MarkView({ mark, colours }: { mark: Mark; colours: Colours }) {
  switch (mark.kind) {
    case 'line':
      return <Line x1={mark.x1} y1={mark.y1} x2={mark.x2} y2={mark.y2} {...strokeProps(mark.stroke, colours)} />;
    case 'path':
      return <Path d={mark.d} fill={mark.fill ? colours[mark.fill] : 'none'} {...strokeProps(mark.stroke, colours)} />;
    case 'rect':
      return (
        <Rect
          x={mark.x}
          y={mark.y}
          width={mark.width}
          height={mark.height}
          fill={mark.fill ? colours[mark.fill] : 'none'}
          {...strokeProps(mark.stroke, colours)}
        />
      );
    case 'circle':
      return (
        <Circle
          cx={mark.cx}
          cy={mark.cy}
          r={mark.r}
          fill={mark.fill ? colours[mark.fill] : 'none'}
          {...strokeProps(mark.stroke, colours)}
        />
      );
    case 'text':
      return (
        <SvgText
          x={mark.x}
          y={mark.y}
          fontSize={mark.size}
          textAnchor={mark.anchor}
          fill={colours[mark.pigment]}
          fontFamily={families[mark.font]}
        >
          {mark.text}
        </SvgText>
      );
  }
}

function strokeProps(stroke: Stroke | undefined, colours: Colours) {
  if (!stroke) return {};
  return {
    stroke: colours[stroke.pigment],
    strokeWidth: stroke.width,
    strokeLinejoin: 'round' as const,
    ...(stroke.dash ? { strokeDasharray: stroke.dash.join(' ') } : {}),
    ...(stroke.round ? { strokeLinecap: 'round' as const } : {}),
  };
}
