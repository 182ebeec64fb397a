import type { ReactElement, ReactNode } from 'react';
import { SectionDrawing } from '@/components/pieces/section-drawing';
import { sectionWords, type PieceShape } from '@/components/pieces/section-words';
import type { ConeChart } from '@/lib/pieces/domain/cone';
import { Absorption, ConeBending } from './chart-drawings';
import { drawingWords, NoteFigure } from './drawing-frame';
import { FillLevel, LiquidSurface } from './filling-drawings';
import { Combination, Depth, FootMark, LidApart } from './measure-drawings';
import { LipBand, RimTest } from './rim-drawings';

/** Drawings that are the section of one piece, as everywhere else. */
const PIECES: Readonly<Record<string, PieceShape>> = {
  crazing: { form: 'mug', inside: 'glazed', crazed: true },
  'bare-inside': { form: 'bowl', inside: 'unglazed' },
  'bare-spots': { form: 'bowl', inside: 'partly-glazed' },
  'low-fired': { form: 'jar', inside: 'partly-glazed', crazed: true },
  'childs-mug': { form: 'cup', inside: 'glazed' },
};

const OWN: Readonly<Record<string, () => ReactElement>> = {
  'lip-band': LipBand,
  'rim-test': RimTest,
  'fill-level': FillLevel,
  'liquid-surface': LiquidSurface,
  depth: Depth,
  lid: LidApart,
  combination: Combination,
  'foot-mark': FootMark,
  absorption: Absorption,
};

/** Names of all drawings a note can hold. */
export const DRAWINGS: readonly string[] = [...Object.keys(PIECES), ...Object.keys(OWN), 'cone-chart'];

type Props = {
  readonly of: string;
  readonly charts: readonly ConeChart[];
  /** Citations of the figures in the drawing. */
  readonly children?: ReactNode;
};

/** A drawing of a note by its name. Throws for a name there is none of: shipped content is part of the program. */
export function NoteDrawing({ of, charts, children }: Props): ReactElement {
  const piece = PIECES[of];
  const Own = OWN[of];
  if (piece !== undefined) {
    const said = { ...sectionWords(piece), title: drawingWords(of, 'title'), about: drawingWords(of, 'about') };
    return <NoteFigure name={of} drawing={<SectionDrawing {...piece} words={said} />} legend={said.key} sources={children} />;
  }
  if (Own !== undefined) return <NoteFigure name={of} drawing={<Own />} sources={children} />;
  if (of !== 'cone-chart') throw new Error(`There is no drawing "${of}"`);
  return <NoteFigure name={of} drawing={<ConeBending charts={charts} />} sources={children} />;
}
