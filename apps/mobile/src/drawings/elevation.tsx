import {
  cablePlanes,
  type ElevationCable,
  type ElevationFigure,
  type ElevationLine,
  type ElevationPoint,
  elevation,
} from '@strandnote/core/drawing';
import { useRouter } from 'expo-router';
import { type KeyboardEvent, type MouseEvent, useMemo, useState } from 'react';
import { View } from 'react-native';
import { fonts } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { Stack, Text } from '../ui/index.ts';
import { Figure } from './figure.tsx';
import { Measured } from './measured.tsx';

export interface DrawnCable extends ElevationCable {
  /** Place of the lower anchor across the structure (m): cables of one plane are drawn together. */
  y: number;
  /** The zone in words: "within, not proven". */
  zoneLabel: string;
}

export interface ElevationProps {
  name: string;
  deck: readonly ElevationPoint[];
  supports: readonly (readonly ElevationPoint[])[];
  cables: readonly DrawnCable[];
  /** Where a touched line leads. */
  hrefOf: (cableId: string) => string;
  maxHeight?: number;
}

/** A structure drawn from its cables, plane by plane; each line opens its cable. */
export function Elevation({ name, deck, supports, cables, hrefOf, maxHeight = 260 }: ElevationProps) {
  const planes = useMemo(() => cablePlanes(cables), [cables]);
  return (
    <Stack gap={2}>
      {planes.map((plane) => (
        <View key={plane.y} style={{ minWidth: 0 }}>
          {planes.length > 1 ? (
            <Text size="note" tone="muted">{`Cable plane at y = ${plane.y.toFixed(1).replace('-', '\u2212')} m`}</Text>
          ) : null}
          <Plane name={name} deck={deck} supports={supports} cables={plane.cables} hrefOf={hrefOf} maxHeight={maxHeight} />
        </View>
      ))}
    </Stack>
  );
}

function Plane({ name, deck, supports, cables, hrefOf, maxHeight = 260 }: ElevationProps) {
  return (
    <View role="group" aria-label={`Elevation of ${name}, ${cables.length} cables`}>
      <Measured interactive minHeight={80}>
        {(width) => <PlaneDrawing figure={elevation({ deck, supports, cables }, { width, maxHeight })} cables={cables} hrefOf={hrefOf} />}
      </Measured>
    </View>
  );
}

interface PlaneDrawingProps {
  figure: ElevationFigure;
  cables: readonly DrawnCable[];
  hrefOf: (cableId: string) => string;
}

/** The drawing, and over it a broad invisible line for each cable. One stop for the Tab key; arrow keys go from cable to cable. */
function PlaneDrawing({ figure, cables, hrefOf }: PlaneDrawingProps) {
  const router = useRouter();
  const [reachable, setReachable] = useState(0);
  const zones = new Map(cables.map((cable) => [cable.id, cable.zoneLabel]));
  const follow = (event: MouseEvent, href: string) => {
    if (event.ctrlKey || event.metaKey || event.shiftKey) return;
    event.preventDefault();
    router.push(href as '/');
  };
  return (
    <View style={{ width: figure.width, height: figure.height }}>
      <Figure figure={figure} />
      {/* biome-ignore lint/a11y/noSvgWithoutTitle: each link in it has its own name */}
      <svg
        width={figure.width}
        height={figure.height}
        style={{ position: 'absolute', left: 0, top: 0 }}
        onKeyDown={(event) => setReachable((index) => moveFocus(event, index, figure.lines.length))}
      >
        {figure.lines.map((line, index) => (
          <CableLink
            key={line.id}
            line={line}
            name={`${line.reference}, ${zones.get(line.id) ?? ''}`}
            href={hrefOf(line.id)}
            reachable={index === reachable}
            onFollow={follow}
          />
        ))}
      </svg>
    </View>
  );
}

interface CableLinkProps {
  line: ElevationLine;
  name: string;
  href: string;
  reachable: boolean;
  onFollow: (event: MouseEvent, href: string) => void;
}

/** Under the pointer or with the focus the line is banded and named: a ring around its box would point at half the fan. */
function CableLink({ line, name, href, reachable, onFollow }: CableLinkProps) {
  const { verdigris } = useColours();
  const [pointed, setPointed] = useState(false);
  const ends = { x1: line.x1, y1: line.y1, x2: line.x2, y2: line.y2 };
  return (
    <a
      href={href}
      aria-label={name}
      tabIndex={reachable ? 0 : -1}
      onClick={(event) => onFollow(event, href)}
      onFocus={() => setPointed(true)}
      onBlur={() => setPointed(false)}
      onMouseEnter={() => setPointed(true)}
      onMouseLeave={() => setPointed(false)}
      style={{ outline: 'none' }}
    >
      <line {...ends} stroke="transparent" strokeWidth={14} strokeLinecap="round" pointerEvents="stroke" />
      {pointed ? (
        <line {...ends} stroke={verdigris} strokeOpacity={0.45} strokeWidth={9} strokeLinecap="round" pointerEvents="none" />
      ) : null}
      {pointed ? <NameOfLine line={line} /> : null}
    </a>
  );
}

function NameOfLine({ line }: { line: ElevationLine }) {
  const { sheet, ink } = useColours();
  const width = line.reference.length * 9 + 12;
  const x = (line.x1 + line.x2) / 2;
  const y = Math.max(14, (line.y1 + line.y2) / 2 - 20);
  return (
    <g pointerEvents="none">
      <rect x={x - width / 2} y={y - 14} width={width} height={22} fill={sheet} stroke={ink} strokeWidth={1} />
      <text x={x} y={y + 2} textAnchor="middle" fontSize={14} fontFamily={fonts.figuresStrong} fill={ink}>
        {line.reference}
      </text>
    </g>
  );
}

function moveFocus(event: KeyboardEvent<SVGSVGElement>, index: number, count: number): number {
  const step = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 }[event.key];
  if (step === undefined || count === 0) return index;
  event.preventDefault();
  const next = (index + step + count) % count;
  event.currentTarget.querySelectorAll<SVGAElement>('a')[next]?.focus();
  return next;
}
