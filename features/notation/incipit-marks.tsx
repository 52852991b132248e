import { colour } from '@/features/ui';
import type { IncipitLayout, PlacedNote } from './incipit-layout';
import type { IncipitProps } from './incipit-props';
import { noteheadPath } from './notehead-path';
import { stateLook } from './orbit-state';
import { SvgLabel } from './svg-label';
import { toDouble } from './to-double';

const STAFF_STROKE = 0.8;
/** In staff spaces. */
const LONG_STEM = 3;
const SHORT_STEM = 2.2;
const SHORT_STEM_UNDER = 1.4;
const NO_STEM_UNDER = 0.8;
/** px. */
const SMALL_LETTERS_UNDER = 9;
const NO_LETTERS_UNDER = 7;

/** The five lines, and the levels they stand for. */
export function StaffMark({ layout, levels }: { layout: IncipitLayout; levels: readonly number[] | null }) {
  const { left, right, top, space, labelSize } = layout;
  const lines = [0, 1, 2, 3, 4].map((i) => `M${left} ${top + i * space}H${right}`).join('');
  const every = space >= 12 ? 1 : 2;
  return (
    <g>
      <path d={lines} stroke={colour.staff} strokeWidth={STAFF_STROKE} fill="none" />
      {(levels ?? []).map((level, i) =>
        i % every === 0 ? (
          <SvgLabel key={level} x={left - 7} y={top + i * space + labelSize * 0.36} size={labelSize} anchor="end">
            {String(level).replace('-', '−')}
          </SvgLabel>
        ) : null,
      )}
    </g>
  );
}

function stemPath(note: PlacedNote, layout: IncipitLayout): string {
  const { gap, space, noteWidth, top } = layout;
  if (gap < NO_STEM_UNDER * space) return '';
  const length = (gap < SHORT_STEM_UNDER * space ? SHORT_STEM : LONG_STEM) * space;
  const isLow = note.y > top + 2 * space;
  const x = note.x + (isLow ? 1 : -1) * noteWidth * 0.46;
  return `M${x.toFixed(1)} ${(note.y - (isLow ? 1 : -1)).toFixed(1)}v${isLow ? -length : length}`;
}

/** Stems and noteheads; those that differ in oxide. */
export function NotesMark({ layout }: { layout: IncipitLayout }) {
  const { notes, noteWidth, space } = layout;
  const heads = (differ: boolean) =>
    notes
      .filter((note) => note.differs === differ)
      .map((note) => noteheadPath(note.x, note.y, noteWidth))
      .join('');
  const differing = heads(true);
  return (
    <g>
      <path
        d={notes.map((note) => stemPath(note, layout)).join('')}
        stroke={colour.ink}
        strokeWidth={space < 7 ? 1.2 : 1.4}
        fill="none"
      />
      <path d={heads(false)} fill={colour.ink} />
      {differing ? <path d={differing} fill={colour.oxide} /> : null}
    </g>
  );
}

/** The letters of the itinerary under their notes. */
export function LettersMark({ layout }: { layout: IncipitLayout }) {
  const { notes, gap, bottom, space } = layout;
  if (gap < NO_LETTERS_UNDER) return null;
  const size = gap < SMALL_LETTERS_UNDER ? 11 : 13;
  const y = bottom + space * 1.6 + 15;
  return (
    <g>
      {notes.map((note) =>
        note.letter === null ? null : (
          <SvgLabel
            key={note.crossing}
            x={note.x}
            y={y}
            size={size}
            anchor="middle"
            face={note.differs ? 'numberSemibold' : 'number'}
            paint={note.differs ? colour.oxide : colour.muted}
            underline={note.differs}
          >
            {note.letter}
          </SvgLabel>
        ),
      )}
    </g>
  );
}

/** Where an orbit ended that does not close: an open notehead, and the height of the first note as a dotted line. */
export function EndMark({ layout, end }: { layout: IncipitLayout; end: IncipitProps['end'] }) {
  const first = layout.notes[0];
  if (!end || !first) return null;
  const x = layout.xOf(toDouble(end.time));
  const y = layout.yOf(toDouble(end.value));
  return (
    <g>
      <path d={`M${first.x} ${first.y}H${x}`} stroke={colour.oxide} strokeWidth={1.4} strokeDasharray="2 2.6" />
      <path d={noteheadPath(x, y, layout.noteWidth)} fill={colour.page} stroke={colour.oxide} strokeWidth={1.8} />
    </g>
  );
}

/** "first 32 of 64" and the state's word, in place of the bar. */
export function CutMark({ layout, state }: { layout: IncipitLayout; state: IncipitProps['state'] }) {
  const { cut, top, space } = layout;
  if (!cut) return null;
  const middle = top + 2 * space;
  const { word, tone } = stateLook[state];
  return (
    <g>
      <SvgLabel x={cut.x} y={middle - 2} face="reading">
        {cut.text}
      </SvgLabel>
      <SvgLabel x={cut.x} y={middle + 13} face="reading" paint={colour[tone]}>
        {word}
      </SvgLabel>
    </g>
  );
}

/** The ring around the selected crossing. */
export function RingMark({ layout, selected }: { layout: IncipitLayout; selected: number | null | undefined }) {
  const note = layout.notes.find(({ crossing }) => crossing === selected);
  if (!note) return null;
  const radius = layout.noteWidth / 2 + 4;
  return <path d={noteheadPath(note.x, note.y, 2 * radius)} fill="none" stroke={colour.indigo} strokeWidth={2} />;
}
