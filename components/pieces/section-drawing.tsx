import { useId, type ReactElement } from 'react';
import { sectionOf, smoothLine, type Section } from '@/lib/pieces/domain/section';
import { Measures } from './section-measures';
import { halfPath, leftOf, linesAcross, paperFor, rightOf, seenFromOutside, wallPath, type Paper } from './section-paper';
import { Patterns, SurfaceBand } from './section-patterns';
import type { PieceShape, SectionWords } from './section-words';

type Props = PieceShape & { readonly words: SectionWords };

/**
 * A piece as potters draw it: the left half cut and filled, the right half from outside, the axis between.
 * Drawn on the server, at the measures that are known; title and description say the same in words.
 */
export function SectionDrawing({ words, ...piece }: Props): ReactElement {
  const id = useId();
  const section = sectionOf(piece.form, piece);
  const lidded = piece.lidded === true;
  const paper = paperFor(section, lidded);
  const guess = piece.form === undefined;
  return (
    <svg className="drawing" viewBox={`0 0 ${paper.width} ${paper.height}`} role="img" aria-labelledby={`${id}t ${id}d`}>
      <title id={`${id}t`}>{words.title}</title>
      <desc id={`${id}d`}>{words.about}</desc>
      <Patterns id={id} section={section} paper={paper} />
      <g fill="none" className="stroke-iron" strokeWidth="1.5" strokeLinejoin="round" strokeLinecap="round" {...(guess ? DASHED : {})}>
        <Outside id={id} section={section} paper={paper} rimDecorated={piece.rimDecorated === true} />
        <Cut section={section} paper={paper} filled={!guess} />
        <SurfaceBand id={id} section={section} paper={paper} inside={piece.inside} crazed={piece.crazed === true} />
        <path d={smoothLine(section.inner, leftOf(paper))} strokeWidth="2.8" />
        {lidded ? <Lid section={section} paper={paper} /> : null}
      </g>
      <Axis paper={paper} />
      <Measures section={section} paper={paper} words={words} />
      {guess ? (
        <text x={paper.axis} y={paper.top - 14} textAnchor="middle">
          {words.unknown}
        </text>
      ) : null}
    </svg>
  );
}

const DASHED = { strokeDasharray: '5 4' } as const;

type Drawn = { readonly section: Section; readonly paper: Paper };

/** Right half: handle, silhouette, what is decorated near the rim, and the lines one sees across. */
function Outside({ id, section, paper, rimDecorated }: Drawn & { readonly id: string; readonly rimDecorated: boolean }): ReactElement {
  const to = rightOf(paper);
  const seen = halfPath(seenFromOutside(section.outer), to);
  const handle = section.handle.length === 0 ? null : smoothLine(section.handle, to);
  const thick = Math.max(5, 9 * paper.scale);
  return (
    <>
      {handle === null ? null : (
        <>
          <path d={handle} strokeWidth={thick + 3} />
          <path d={handle} className="stroke-bisque" strokeWidth={thick} />
        </>
      )}
      <path d={seen} className="fill-bisque" />
      {rimDecorated ? <path d={seen} fill={`url(#${id}hatch)`} clipPath={`url(#${id}rim)`} strokeWidth="0" /> : null}
      {linesAcross(section.outer).map((edge) => (
        <path key={edge.join()} d={`M${paper.axis},${to(edge)[1]}H${to(edge)[0]}`} strokeWidth="1" />
      ))}
      <path d={seen} />
    </>
  );
}

/** Left half: what lies behind the cut, then the wall itself, in the colour of clay. */
function Cut({ section, paper, filled }: Drawn & { readonly filled: boolean }): ReactElement {
  const to = leftOf(paper);
  const rim = section.fills === null ? null : to([section.inner.at(-1)?.[0] ?? 0, section.fills.rim]);
  return (
    <>
      {section.spout.length === 0 ? null : <path d={`${smoothLine(section.spout, to)}Z`} className="fill-bisque" />}
      <path d={halfPath(section.inner, to)} className="fill-bisque" strokeWidth="0" />
      <path d={wallPath(section.outer, section.inner, to)} className={filled ? 'fill-oxide' : 'fill-bisque'} strokeWidth="1" />
      {rim === null ? null : <path d={`M${rim.join()}H${paper.axis}`} strokeWidth="1" />}
    </>
  );
}

function Lid({ section, paper }: Drawn): ReactElement | null {
  if (section.lid === null) return null;
  const { outer, inner } = section.lid;
  return (
    <>
      <path d={wallPath(outer, inner, leftOf(paper))} className="fill-oxide" strokeWidth="1" />
      <path d={halfPath(outer, rightOf(paper))} className="fill-bisque" />
    </>
  );
}

function Axis({ paper: { axis, top, ground } }: { readonly paper: Paper }): ReactElement {
  return <path d={`M${axis},${top - 10}V${ground + 10}`} className="stroke-iron" strokeWidth="0.9" strokeDasharray="9 3 1.5 3" />;
}
