import type { CoreTestInput, CoreTestResult } from '@libs/core-loss';
import type { Route } from '@shared/route';
import type { WAIVER_REASONS } from '@shared/waivers';
import type { JobPaperBase } from './paper-model.js';

export type VerdictOnPaper = 'conforms' | 'does-not-conform' | 'inconclusive' | 'not-valid' | 'shown-not-judged';

/** One core test as it was recorded: readings, and the result that was kept with them. */
export interface CoreTestOnPaper {
  /** what the shop calls it: 'before', 'after burnout', 'after repair' */
  readonly title: string;
  readonly testedAt: string;
  readonly testedBy: string;
  readonly input: CoreTestInput;
  readonly result: CoreTestResult;
  readonly remark: string;
}

/** A signature: the person's own password at the moment of signing, kept with the hash of what was signed. */
export interface SignatureOnPaper {
  readonly act: 'tested' | 'released' | 'countersigned' | 'conceded';
  readonly name: string;
  readonly role: string;
  readonly at: string;
  /** sha-256 in hex of what was signed; the first twelve digits are printed */
  readonly contentHash: string;
}

/** Why there is no core test before. */
export interface MissingBeforeTest {
  readonly reason: (typeof WAIVER_REASONS)[number];
  readonly words: string;
  readonly askedBy: string;
  readonly askedAt: string;
  readonly countersignature: SignatureOnPaper | null;
}

/** A record that lets a job pass where the test alone does not. */
export interface StatementOnPaper {
  readonly kind: 'concession' | 'inconclusive-release' | 'decision';
  /** which record it is about: 'Core test after, 4 March 2026' */
  readonly about: string;
  readonly words: string;
  /** the customer's recorded answer; null where none is needed */
  readonly customerAnswer: { readonly choice: string; readonly by: string; readonly channel: string; readonly at: string; readonly words: string } | null;
  readonly signature: SignatureOnPaper;
}

export interface BurnoutOnPaper {
  /** 'oven O1', or how the winding was taken out where no oven was used */
  readonly method: string;
  readonly startedAt: string;
  readonly partPeakC: number | null;
  readonly limitC: number | null;
  readonly limitReason: string;
  readonly minutesAbove: { readonly thresholdC: number; readonly minutes: number } | null;
  readonly verdict: VerdictOnPaper;
  readonly remark: string;
}

export interface WindingRowOnPaper {
  readonly item: string;
  readonly asFound: string;
  readonly asWound: string;
}

/** Readings and limits come in words, in the units they were taken in; the verdict with its source. */
export interface TestRowOnPaper {
  readonly test: string;
  readonly reading: string;
  readonly limit: string;
  readonly verdict: VerdictOnPaper;
  readonly source: string;
  readonly standing: string;
}

export interface InstrumentOnPaper {
  readonly use: string;
  readonly name: string;
  readonly serial: string;
  /** YYYY-MM-DD; null where no calibration is recorded */
  readonly calibratedOn: string | null;
  readonly dueOn: string | null;
}

export interface CertificateModel extends JobPaperBase {
  readonly kind: 'certificate';
  readonly route: Route;
  readonly receivedAt: string;
  readonly replaces: { readonly number: string; readonly issuedAt: string; readonly reason: string } | null;
  readonly supersededBy: { readonly number: string; readonly issuedAt: string } | null;
  readonly verification: { readonly code: string; readonly checkUrl: string };
  readonly limits: { readonly version: number; readonly publishedAt: string; readonly decisionRule: 'ask' | 'accept' | 'refuse'; readonly coverageFactor: number };
  /** null where the route has no core test or it is waived as a whole */
  readonly coreBefore: CoreTestOnPaper | null;
  /** the one that decides */
  readonly coreAfter: CoreTestOnPaper | null;
  /** tests between: not valid and repeated, or before a core repair; oldest first */
  readonly coreBetween: readonly CoreTestOnPaper[];
  readonly missingBefore: MissingBeforeTest | null;
  readonly statements: readonly StatementOnPaper[];
  readonly burnouts: readonly BurnoutOnPaper[];
  readonly winding: readonly WindingRowOnPaper[];
  readonly finalTests: readonly TestRowOnPaper[];
  readonly instruments: readonly InstrumentOnPaper[];
  readonly signatures: readonly SignatureOnPaper[];
  readonly remark: string;
}
