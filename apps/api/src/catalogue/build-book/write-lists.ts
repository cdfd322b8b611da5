import type { BookVoice, BuildBook } from './build-book.js';
import { boxText, fixedText, numberText, signedText } from '../../typesetting/number-text.js';
import { contentWidth, mm, page, textWidth } from '../../typesetting/page-geometry.js';
import { orientationWords, specDifferences, specRows, type SpecDifferences } from './print-spec-words.js';
import type { Sheet } from '../../typesetting/sheet.js';
import { writeTable } from '../../typesetting/table.js';
import { styles } from '../../typesetting/text-styles.js';

const lead = (sheet: Sheet, words: string): void => {
  const place = { x: page.left, width: textWidth };
  sheet.block('P', () => sheet.write(sheet.lines(words, styles.lead, textWidth), styles.lead, place));
  sheet.y += 9;
};

export const writePartsList = (sheet: Sheet, { parts, printSpec }: BuildBook): void => {
  const { letterOf, sets } = specDifferences(parts, printSpec);
  writeTable(sheet, {
    x: page.left,
    columns: [
      { title: 'Code', width: mm(14) },
      { title: 'Part', width: mm(40) },
      { title: 'Print', width: mm(11), align: 'right' },
      { title: 'Size x × y × z, mm', width: mm(34), align: 'right' },
      { title: 'Each, cm³', width: mm(16), align: 'right' },
      { title: sets.length === 0 ? 'Placing' : 'Placing, and settings of its own', width: mm(35) },
    ],
    rows: parts.map((part) => {
      const letter = letterOf.get(part.code);
      return [
        [{ text: part.code, face: 'semibold' as const }],
        part.name,
        `${part.quantity}`,
        part.sizeMm ? part.sizeMm.map((sideMm) => fixedText(sideMm, 1)).join(' × ') : '–',
        part.volumeCm3 === null ? '–' : fixedText(part.volumeCm3, 1),
        [
          { text: orientationWords[part.orientation] },
          ...(letter === undefined ? [] : [{ text: `, ${letter}`, face: 'semibold' as const }]),
        ],
      ];
    }),
  });
  writeOwnSettings(sheet, sets);
};

/** The legend of the letters in the list: what is set otherwise for those parts. */
const writeOwnSettings = (sheet: Sheet, sets: SpecDifferences['sets']): void => {
  const style = styles.table;
  const place = { x: page.left + mm(14), width: textWidth };
  for (const { letter, words } of sets) {
    sheet.y += 7;
    sheet.ensure(2 * style.leading);
    sheet.block('P', () => {
      sheet.put([{ text: letter, face: 'semibold' }], style, { x: page.left, width: mm(12) }, sheet.y);
      sheet.write(sheet.lines(words, style, place.width), style, place);
    });
  }
};

export const writeHardware = (sheet: Sheet, { hardware }: BuildBook): void => {
  if (hardware.length === 0) {
    lead(sheet, 'Nothing but the printed parts.');
    return;
  }
  writeTable(sheet, {
    x: page.left,
    columns: [
      { title: 'Quantity', width: mm(24), align: 'right' },
      { title: 'Item', width: mm(56) },
      { title: 'What for', width: mm(70) },
    ],
    rows: hardware.map(({ quantity, unit, name, remark }) => [
      `${numberText(quantity, 2)}${unit === '' ? '' : ` ${unit}`}`,
      [{ text: name, face: 'semibold' as const }],
      remark,
    ]),
  });
};

export const writePrintSpecification = (sheet: Sheet, { printSpec, parts, buildVolume }: BuildBook): void => {
  writeTable(sheet, {
    x: page.left,
    columns: [
      { title: 'Setting', width: mm(40) },
      { title: 'Value', width: textWidth - mm(40) },
    ],
    rows: [
      ...specRows(printSpec),
      ['Build volume', `${boxText(buildVolume.xMm, buildVolume.yMm, buildVolume.zMm)} mm`] as const,
    ].map(([name, value]) => [name, [{ text: value, face: 'semibold' as const }]]),
  });
  const differing = specDifferences(parts, printSpec).sets.map(
    ({ letter, words, codes }) => `${codes.join(', ')} (${letter} in the list of parts): ${words}`,
  );
  const style = styles.body;
  for (const words of [printSpec.remarks.trim(), ...differing].filter((one) => one !== '')) {
    sheet.y += 9;
    sheet.block('P', () =>
      sheet.write(sheet.lines(words, style, textWidth), style, { x: page.left, width: textWidth }),
    );
  }
};

const kindWords: Record<BookVoice['kind'], string> = {
  'stopped-pipe': 'Stopped pipe',
  'open-pipe': 'Open pipe',
  'free-bar': 'Free bar',
  tine: 'Tine',
  string: 'String',
  vessel: 'Vessel',
};

export const writeVoicing = (sheet: Sheet, { voices, room, declaredCents }: BuildBook): void => {
  const air =
    room.relativeHumidity === undefined ? '' : ` and ${Math.round(room.relativeHumidity * 100)} % humidity`;
  lead(
    sheet,
    `Computed for a room of ${numberText(room.temperatureC, 1)} °C${air}, A4 = ${numberText(room.a4Hz ?? 440, 1)} Hz. ` +
      `Each voice is drawn to be within ± ${numberText(declaredCents, 1)} cents of its note. What follows ± in the table is how far ` +
      'the printed voice may be from the computed one: a prediction, no promise. Tune by ear or by tuner.',
  );
  writeTable(sheet, {
    x: page.left,
    columns: [
      { title: 'Note', width: mm(13) },
      { title: 'Part', width: mm(15) },
      { title: 'Kind and sizes', width: contentWidth - mm(92) },
      { title: 'Length, mm', width: mm(21), align: 'right' },
      { title: 'Pitch, Hz', width: mm(20), align: 'right' },
      { title: 'Cents', width: mm(23), align: 'right' },
    ],
    rows: voices.map(({ code, note, kind, dimensions, lengthMm, predicted }) => [
      [{ text: note.replace('#', '♯').replace(/^([A-G])b/, '$1♭'), face: 'semibold' as const }],
      code,
      dimensions === '' ? kindWords[kind] : `${kindWords[kind]}, ${dimensions}`,
      lengthMm === null ? '–' : fixedText(lengthMm, 2),
      predicted ? fixedText(predicted.hz, 1) : '–',
      predicted
        ? `${signedText(predicted.cents, 1)} ± ${fixedText(predicted.uncertaintyCents, 0)}`
        : 'not computed',
    ]),
  });
};
