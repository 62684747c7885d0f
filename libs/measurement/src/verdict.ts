/** The four words for a measured result against a limit. They do not depend on the shop's decision rule. */
export type Verdict = 'conforms' | 'does-not-conform' | 'inconclusive' | 'not-valid';

/** From best to worst: the order in which several verdicts on one thing are summed up. */
export const VERDICTS = ['conforms', 'inconclusive', 'does-not-conform', 'not-valid'] as const satisfies readonly Verdict[];

/** What the shop lets an inconclusive result do at a gate. It never changes the verdict itself. */
export type DecisionRule = 'ask' | 'accept' | 'refuse';

/** What a gate does with a verdict. */
export type GateOutcome = 'open' | 'ask' | 'closed';
