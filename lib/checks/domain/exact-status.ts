import { NO, UNKNOWN, YES, type Tri } from '@/lib/kernel/tri';
import { lowestBit, type Diagram } from './diagram';

const MAY_BE_NO = 1;
const MAY_BE_YES = 2;
const MAY_BE_BOTH = 3;

/** The exact status of diagram nodes: yes or no if every completion of what is known says so. */
export class ExactStatus {
  private readonly reached: Int32Array;
  private readonly round: Int32Array;
  private now = 1;

  constructor(private readonly diagram: Diagram) {
    this.reached = new Int32Array(diagram.size);
    this.round = new Int32Array(diagram.size);
  }

  /** Begins anew: what was known of the nodes no longer holds once the masks have changed. */
  forget(): void {
    this.now += 1;
  }

  /** The status of a node under masks that have not changed since the last `forget`. */
  of(node: number, masks: Int32Array): Tri {
    const leaves = this.leavesBelow(node, masks);
    if (leaves === MAY_BE_BOTH) return UNKNOWN;
    return leaves === MAY_BE_YES ? YES : NO;
  }

  private leavesBelow(node: number, masks: Int32Array): number {
    if (node === 0) return MAY_BE_NO;
    if (node === 1) return MAY_BE_YES;
    if (this.round[node]! === this.now) return this.reached[node]!;
    const first = this.diagram.first[node]!;
    let leaves = 0;
    let live = masks[this.diagram.variable[node]!]!;
    for (; live !== 0 && leaves !== MAY_BE_BOTH; live &= live - 1) {
      leaves |= this.leavesBelow(this.diagram.child[first + lowestBit(live)]!, masks);
    }
    this.round[node] = this.now;
    this.reached[node] = leaves;
    return leaves;
  }
}
