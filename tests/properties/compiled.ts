import { compileLine, type CompiledLine, type LineInput } from '@/lib/checks/domain/line';
import type { Tri } from '@/lib/kernel/tri';
import type { Truth } from './oracle';

/** The invented lines are all sound: a fault is a mistake in the engine or in the generator. */
export function compiled(input: LineInput): CompiledLine {
  const line = compileLine(input);
  if (!line.ok) throw new Error(`A sound line was refused: ${JSON.stringify(line.error)}`);
  return line.value;
}

const TRUTHS: Readonly<Record<Tri, Truth>> = { 0: 'no', 1: 'open', 2: 'yes' };

/** The engine's value in the oracle's words. */
export const inWords = (value: Tri | undefined): Truth | undefined => (value === undefined ? undefined : TRUTHS[value]);
