import type { PieceShape } from '@/components/pieces/section-words';
import type { Answers } from '@/lib/checks/domain/knowledge';

/** What the drawing of a piece may use of what was said. */
export function pieceShape(answers: Answers): PieceShape {
  const text = (id: string): string | undefined => (typeof answers[id] === 'string' ? answers[id] : undefined);
  const amount = (id: string): number | undefined => (typeof answers[id] === 'number' ? answers[id] : undefined);
  const yes = (id: string): boolean | undefined => (typeof answers[id] === 'boolean' ? answers[id] : undefined);
  return {
    form: text('form'),
    depthMm: amount('depth-mm'),
    capacityMl: amount('capacity-ml'),
    inside: text('inside'),
    crazed: yes('crazed'),
    rimDecorated: yes('rim-decorated'),
    lidded: yes('lidded'),
  };
}
