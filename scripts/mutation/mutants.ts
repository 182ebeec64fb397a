import ts from 'typescript';

/** One small change to a source: `original` is the text replaced, `static` means it acts while the file loads. */
export type Mutant = {
  readonly id: number;
  readonly file: string;
  readonly line: number;
  readonly original: string;
  readonly mutated: string;
  readonly isStatic: boolean;
};

/** A source in which every mutant sleeps; the one whose number `planted.now` holds is awake. */
export type Mutated = { readonly code: string; readonly mutants: readonly Mutant[] };

const K = ts.SyntaxKind;
const SWAPS: Readonly<Record<string, string>> = {
  '<': '<=',
  '<=': '<',
  '>': '>=',
  '>=': '>',
  '===': '!==',
  '!==': '===',
  '+': '-',
  '-': '+',
  '*': '+',
  '<<': '>>',
  '>>': '<<',
  '>>>': '<<',
  '&': '|',
  '|': '&',
  '^': '&',
  '&&': '||',
  '||': '&&',
  '+=': '-=',
  '-=': '+=',
  '*=': '+=',
  '|=': '&=',
  '&=': '|=',
  '||=': '&&=',
};
const CALLS: Readonly<Record<string, string>> = { some: 'every', every: 'some', min: 'max', max: 'min', unshift: 'push' };
/** Calls without which a list stays as it was. */
const DROPPED = new Set(['filter', 'sort', 'toSorted', 'reverse', 'toReversed', 'slice']);

/** Writes a source anew with its mutants in it, numbered from `first`. */
export class Mutator {
  private readonly source: ts.SourceFile;
  private readonly mutants: Mutant[] = [];

  constructor(
    private readonly file: string,
    private readonly text: string,
    private readonly first: number,
  ) {
    this.source = ts.createSourceFile(file, text, ts.ScriptTarget.ES2022, true);
  }

  run(): Mutated {
    return { code: this.render(this.source), mutants: this.mutants };
  }

  private render(node: ts.Node): string {
    if (ts.isTypeNode(node) || ts.isInterfaceDeclaration(node) || ts.isTypeAliasDeclaration(node) || ts.isImportDeclaration(node)) {
      return this.textOf(node);
    }
    const changes = this.changesOf(node);
    const inner = this.renderChildren(node);
    return changes.reduce((code, mutated) => this.asleep(node, mutated, code), inner);
  }

  private renderChildren(node: ts.Node): string {
    let code = '';
    let at = node.getStart(this.source);
    node.forEachChild((child) => {
      code += this.text.slice(at, child.getStart(this.source)) + this.render(child);
      at = child.end;
    });
    return code + this.text.slice(at, node.end);
  }

  /** Both versions side by side; those inside the changed one stay away, since one mutant is awake at a time. */
  private asleep(node: ts.Node, mutated: string, code: string): string {
    const id = this.first + this.mutants.length;
    const { line } = this.source.getLineAndCharacterOfPosition(node.getStart(this.source));
    const isStatic = ts.findAncestor(node, (above) => ts.isFunctionLike(above)) === undefined;
    this.mutants.push({ id, file: this.file, line: line + 1, original: this.textOf(node), mutated, isStatic });
    const awake = `planted.now === ${id}`;
    return ts.isStatement(node) ? `if (${awake}) { ${mutated} } else { ${code} }` : `(${awake} ? (${mutated}) : (${code}))`;
  }

  private textOf = (node: ts.Node): string => node.getText(this.source);

  private changesOf(node: ts.Node): readonly string[] {
    if (isRemovable(node)) return [''];
    if (!ts.isExpression(node)) return [];
    const negated = isCondition(node) ? [`!(${this.textOf(node)})`] : [];
    return [...negated, ...this.changesInside(node)];
  }

  private changesInside(node: ts.Expression): readonly string[] {
    if (ts.isBinaryExpression(node)) return this.swapped(node);
    if (ts.isPrefixUnaryExpression(node)) return this.unsigned(node);
    if (ts.isCallExpression(node)) return this.called(node);
    if (node.kind === K.TrueKeyword) return ['false'];
    return node.kind === K.FalseKeyword ? ['true'] : [];
  }

  private swapped(node: ts.BinaryExpression): readonly string[] {
    const other = SWAPS[this.textOf(node.operatorToken)];
    if (other === undefined) return [];
    return [`${this.textOf(node.left)} ${other} ${this.textOf(node.right)}`];
  }

  private unsigned(node: ts.PrefixUnaryExpression): readonly string[] {
    return [K.ExclamationToken, K.MinusToken, K.TildeToken].includes(node.operator) && !ts.isNumericLiteral(node.operand)
      ? [this.textOf(node.operand)]
      : [];
  }

  private called(node: ts.CallExpression): readonly string[] {
    const callee = node.expression;
    if (!ts.isPropertyAccessExpression(callee)) return [];
    const name = callee.name.text;
    if (DROPPED.has(name)) return [this.textOf(callee.expression)];
    const other = CALLS[name];
    if (other === undefined) return [];
    return [`${this.textOf(callee.expression)}.${other}${this.text.slice(callee.name.end, node.end)}`];
  }
}

/** A statement that does something of its own, or leaves early. */
function isRemovable(node: ts.Node): boolean {
  if (ts.isExpressionStatement(node)) return !ts.isStringLiteral(node.expression);
  if (ts.isIfStatement(node)) return node.elseStatement === undefined;
  return ts.isContinueStatement(node);
}

function isCondition(node: ts.Expression): boolean {
  const { parent } = node;
  if (ts.isIfStatement(parent) || ts.isWhileStatement(parent)) return parent.expression === node && !isComparison(node);
  return (ts.isConditionalExpression(parent) || ts.isForStatement(parent)) && parent.condition === node && !isComparison(node);
}

/** Turned round already by swapping its operator. */
const isComparison = (node: ts.Expression): boolean =>
  ts.isBinaryExpression(node) && [K.EqualsEqualsEqualsToken, K.ExclamationEqualsEqualsToken].includes(node.operatorToken.kind);
