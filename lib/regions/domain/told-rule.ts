import type { Citation, Evidence, Payload, Rule, Source } from './rule';

/** A source as told to a reader: the text and the place in it together. */
export type ToldSource = Omit<Source, 'id'> & Omit<Citation, 'source'>;

/** A payload without its topic, which stands beside it. */
export type ToldPayload = Payload extends infer Each ? (Each extends Payload ? Omit<Each, 'topic'> : never) : never;

/** A rule as told to a reader and through the API: topic beside the payload, sources in full. */
export type ToldRule = Omit<Rule, 'payload' | 'sources'> & {
  readonly topic: Payload['topic'];
  readonly payload: ToldPayload;
  readonly evidence: Evidence;
  readonly sources: readonly ToldSource[];
};

/** Citations with the texts they cite. A citation whose text is missing is left out; a published sheet has none. */
export function tellSources(citations: readonly Citation[], sources: readonly Source[]): readonly ToldSource[] {
  return citations.flatMap(({ source, ...place }) => {
    const text = sources.find(({ id }) => id === source);
    if (text === undefined) return [];
    const { id: _, ...told } = text;
    return [{ ...told, ...place }];
  });
}

/** How well the rule's main statement is known: its figure's state, where it has one, else that of its first source. */
export function evidenceOf(rule: Rule): Evidence {
  return rule.payload.topic === 'limit' ? rule.payload.amount.evidence : (rule.sources[0]?.evidence ?? 'memory');
}

export function tellRule(rule: Rule, sources: readonly Source[]): ToldRule {
  const { topic, ...payload } = rule.payload;
  return { ...rule, topic, payload, evidence: evidenceOf(rule), sources: tellSources(rule.sources, sources) };
}
