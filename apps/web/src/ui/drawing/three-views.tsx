import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { DimensionLine } from './dimension-line.js';
import { PlaceMark } from './place-mark.js';
import {
  boxAround,
  cornersInViews,
  layOutThreeViews,
  placeInViews,
  type Box3,
  type Point3,
  sizeOf,
  type ViewName,
  viewNames,
} from './three-views-layout.js';
import { useWidth } from './use-width.js';

/** A side of a part as it is drawn: SVG paths in mm from the upper left corner of its box. */
interface DrawnSide {
  path: string;
  edges: string;
}
export interface DrawnShape {
  drawings: Record<ViewName, DrawnSide>;
  boxMm: Box3;
}

const Line = chakra('path', {
  base: { fill: 'none', strokeLinejoin: 'round', vectorEffect: 'non-scaling-stroke' },
});

export interface ThreeViewsProps {
  shape: DrawnShape;
  /** Drawn dashed behind it. */
  earlier?: DrawnShape | undefined;
  /** A place to be marked, in the coordinates of the file, and how it is lettered. */
  place?: { atMm: Point3; label: string } | undefined;
  /** What is to be seen, in a sentence. */
  label: string;
  /** A length in mm as it is lettered. */
  sizeText: (mm: number) => string;
  maxHeightPx?: number;
}

/** A part from above, from the front and from the right, to one scale, with its sizes. */
export function ThreeViews({ shape, earlier, place, label, sizeText, maxHeightPx = 340 }: ThreeViewsProps) {
  const [ref, widthPx] = useWidth<HTMLDivElement>();
  const around = earlier ? boxAround(shape.boxMm, earlier.boxMm) : shape.boxMm;
  const layout = layOutThreeViews(around, { widthPx, maxHeightPx });
  const { views, pxPerMm } = layout;
  const at = (view: ViewName, mm: { x: number; y: number }) => ({
    x: views[view].x + mm.x * pxPerMm,
    y: views[view].y + mm.y * pxPerMm,
  });
  const transform = (drawn: DrawnShape, view: ViewName) => {
    const { x, y } = at(view, cornersInViews(drawn.boxMm, around)[view]);
    return `translate(${x} ${y}) scale(${pxPerMm})`;
  };
  const size = sizeOf(shape.boxMm);
  const corners = cornersInViews(shape.boxMm, around);
  const [front, side] = [at('front', corners.front), at('side', corners.side)];
  const foot = views.front.y + views.front.heightPx + 22;
  const marks = place && placeInViews(place.atMm, around);
  return (
    <Box ref={ref} width="full" minHeight="1px">
      {widthPx > 0 && (
        <chakra.svg
          role="img"
          aria-label={label}
          width={`${layout.widthPx}px`}
          height={`${layout.heightPx}px`}
          viewBox={`0 0 ${layout.widthPx} ${layout.heightPx}`}
          maxWidth="full"
          overflow="visible"
          display="block"
        >
          {viewNames.map((view) => (
            <g key={view}>
              {earlier && (
                <g transform={transform(earlier, view)}>
                  <Line d={earlier.drawings[view].path} stroke="ink.soft" strokeDasharray="3 3" />
                </g>
              )}
              <g transform={transform(shape, view)}>
                <Line d={shape.drawings[view].edges} stroke="edge" strokeWidth="0.75" />
                {/* Keeps the dashes clear of the lines they run along. */}
                <Line d={shape.drawings[view].path} stroke="sheet" strokeWidth="4" />
                <Line d={shape.drawings[view].path} stroke="ink" strokeWidth="1.25" />
              </g>
            </g>
          ))}
          <DimensionLine
            x={views.front.x - 12}
            y={front.y}
            lengthPx={size.z * pxPerMm}
            direction="down"
            label={sizeText(size.z)}
          />
          <DimensionLine
            x={front.x}
            y={foot}
            lengthPx={size.x * pxPerMm}
            direction="right"
            label={sizeText(size.x)}
          />
          <DimensionLine
            x={side.x}
            y={foot}
            lengthPx={size.y * pxPerMm}
            direction="right"
            label={sizeText(size.y)}
          />
          {marks &&
            viewNames.map((view) => (
              <PlaceMark
                key={view}
                {...at(view, marks[view])}
                label={view === 'front' ? place.label : undefined}
              />
            ))}
        </chakra.svg>
      )}
    </Box>
  );
}
