import { chakra } from '@chakra-ui/react/styled-system';
import type { PlacedVoice } from './rank-layout.js';

const Lit = chakra('rect', { base: { fill: 'kit.lit', opacity: 0.55 } });
const Deep = chakra('rect', { base: { fill: 'kit.deep' } });
const Hole = chakra('circle', { base: { fill: 'kit.deep' } });
const Hollow = chakra('ellipse', { base: { fill: 'sheet', stroke: 'kit.deep', strokeWidth: '1' } });
const Wire = chakra('rect', { base: { fill: 'kit.deep' } });

/** Nodes of a free bar's first mode lie at 0.224 of its length from each end; there it is hung or rests. */
const nodeOfLength = 0.224;

const Body = ({ placed, fill }: { placed: PlacedVoice; fill: string }) => {
  const { x, y, width, height } = placed;
  return (
    <>
      <rect x={x} y={y} width={width} height={height} fill={fill} />
      {width > 5 && <Lit x={x} y={y} width={width * 0.3} height={height} />}
    </>
  );
};

/** One voice: what tells its kind is drawn on it (a cap, an open mouth, a bar's nodes, a tine's clamp). */
export function VoiceShape({ placed, fill }: { placed: PlacedVoice; fill: string }) {
  const { voice, x, y, width, height } = placed;
  const cap = Math.min(3, height * 0.06);
  switch (voice.kind) {
    case 'stopped-pipe':
      return (
        <>
          <Body placed={placed} fill={fill} />
          <Deep x={x} y={y} width={width} height={cap} />
        </>
      );
    case 'open-pipe':
      return (
        <>
          <Body placed={placed} fill={fill} />
          <Deep x={x + width * 0.18} y={y} width={width * 0.64} height={cap} />
        </>
      );
    case 'free-bar': {
      const radius = Math.max(0.8, Math.min(width * 0.1, 3));
      return (
        <>
          <Body placed={placed} fill={fill} />
          <Hole cx={x + width / 2} cy={y + height * nodeOfLength} r={radius} />
          <Hole cx={x + width / 2} cy={y + height * (1 - nodeOfLength)} r={radius} />
        </>
      );
    }
    case 'tine':
      return (
        <>
          <Body placed={placed} fill={fill} />
          <Deep x={x - 1} y={y + height - 2 * cap} width={width + 2} height={2 * cap} />
        </>
      );
    case 'string':
      return (
        <>
          <Wire x={x} y={y} width={width} height={height} />
          <Hole cx={x + width / 2} cy={y + 1.5} r={Math.max(2, width)} />
        </>
      );
    case 'vessel':
      return (
        <>
          <ellipse cx={x + width / 2} cy={y + height / 2} rx={width / 2} ry={height / 2} fill={fill} />
          <Hollow cx={x + width / 2} cy={y + height / 2} rx={width * 0.38} ry={height * 0.38} />
        </>
      );
  }
}
