import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { type KeyboardEvent, type PointerEvent, useId, useRef, useState } from 'react';
import { partPreviewTexts as texts } from '../../../config/texts/part-preview.js';
import { bytes, number } from '../../../lib/format.js';
import { type DrawnPart, PartThumb } from '../../../ui/drawing/parts-sheet.js';
import { Fault } from '../../../ui/fault.js';
import { Notice } from '../../../ui/notice.js';
import { Progress } from '../../../ui/progress.js';
import { Text } from '../../../ui/text.js';
import { VisuallyHidden } from '../../../ui/visually-hidden.js';
import { hasWebGl } from './has-webgl.js';
import { dragged, firstOrbit, type OrbitStep, stepOfKey, steps } from './orbit.js';
import { TurnButtons } from './turn-buttons.js';
import { useDrawnColours } from './use-drawn-colours.js';
import { usePreview } from './use-preview.js';

const View = chakra('div', {
  base: {
    height: 'min(22rem, 52vh)',
    touchAction: 'none',
    cursor: 'grab',
    bg: 'ground',
    borderWidth: '1px',
    borderColor: 'hairline',
    borderRadius: 'sm',
    overflow: 'hidden',
    _active: { cursor: 'grabbing' },
  },
});

export interface PreviewedPart {
  code: string;
  name: string;
  sizeMm: { x: number; y: number; z: number };
  bytes: number;
  address: string;
  /** Shown where nothing can be turned. */
  drawing: Omit<DrawnPart, 'code'> | null;
}

/** A part in three dimensions, turned by pointer, keys or buttons. It never moves by itself. */
export function PartTurner({ part }: { part: PreviewedPart }) {
  const place = useRef<HTMLDivElement>(null);
  const howId = useId();
  const [canDraw] = useState(hasWebGl);
  const [isLost, setIsLost] = useState(false);
  const [orbit, setOrbit] = useState(firstOrbit);
  // Steps are told; a drag would be told at every pixel.
  const [told, setTold] = useState('');
  const [loading, again] = usePreview(part.address, canDraw);
  const colours = useDrawnColours(place);
  const { x, y, z } = part.sizeMm;

  const step = (name: OrbitStep) => {
    const next = steps[name](orbit);
    setOrbit(next);
    setTold(texts.looking(number(next.aroundDeg), number(next.aboveDeg)));
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const name = event.altKey || event.ctrlKey || event.metaKey ? undefined : stepOfKey(event.key);
    if (!name) return;
    event.preventDefault();
    step(name);
  };
  const onPointerDown = (event: PointerEvent) => event.currentTarget.setPointerCapture(event.pointerId);
  const onPointerMove = (event: PointerEvent) => {
    if (!event.currentTarget.hasPointerCapture(event.pointerId)) return;
    const { movementX, movementY, currentTarget } = event;
    setOrbit((before) => dragged(before, { x: movementX, y: movementY }, currentTarget.clientWidth));
  };

  return (
    <Box ref={place} display="grid" gap="3" gridTemplateColumns="minmax(0, 1fr)">
      {canDraw && loading.state === 'loading' && (
        <Box height="min(22rem, 52vh)" display="grid" alignContent="center">
          <Progress label={texts.loading(bytes(part.bytes))} />
        </Box>
      )}
      {loading.state === 'failed' && <Fault what={texts.failed} fault={loading.fault} onAgain={again} />}
      {loading.state === 'unreadable' && (
        <Notice tone="stop" title={texts.failed} isNews>
          {texts.unreadable}
        </Notice>
      )}
      {isLost && (
        <Notice tone="warn" title={texts.failed} isNews>
          {texts.lost}
        </Notice>
      )}
      {!canDraw && (
        <>
          <Notice tone="note" title={texts.failed}>
            {texts.noWebGl}
          </Notice>
          {part.drawing && (
            <Box display="grid" placeItems="center" paddingBlock="4">
              <PartThumb part={part.drawing} sizePx={240} />
            </Box>
          )}
        </>
      )}
      {loading.state === 'here' && !isLost && colours && (
        <>
          <View
            role="application"
            aria-label={texts.view(texts.title(part.code, part.name))}
            aria-describedby={howId}
            tabIndex={0}
            onKeyDown={onKeyDown}
            onPointerDown={onPointerDown}
            onPointerMove={onPointerMove}
          >
            <loading.PartModel
              model={loading.model}
              orbit={orbit}
              colours={colours}
              onLost={() => setIsLost(true)}
            />
          </View>
          <VisuallyHidden role="status">{told}</VisuallyHidden>
          <TurnButtons onStep={step} />
          <Text look="small" isSoft id={howId}>
            {texts.how}
          </Text>
        </>
      )}
      <Text>{texts.size(number(x, 1), number(y, 1), number(z, 1))}</Text>
      <Text look="small" isSoft>
        {texts.coarse}
      </Text>
    </Box>
  );
}
