import type { Nameplate } from '@shared/machines';

export type PaperSize = 'A4' | 'Letter';
export type PaperUnits = 'si' | 'inch-pound';

/** The shop as it stands at the head of its papers, frozen when the paper was issued. */
export interface ShopOnPaper {
  readonly name: string;
  readonly addressLines: readonly string[];
  readonly phone: string;
  readonly email: string;
  readonly website: string;
  readonly taxNumber: string;
  /** a line the law or the shop wants on every paper: register, managing director */
  readonly registration: string;
}

export interface PartyOnPaper {
  readonly name: string;
  readonly contactName: string;
  readonly addressLines: readonly string[];
  readonly taxNumber: string;
}

export interface MachineOnPaper {
  readonly description: string;
  /** null where no plate was read */
  readonly nameplate: Nameplate | null;
}

export interface JobOnPaper {
  readonly number: string;
  readonly customerReference: string;
}

/** What every paper says. All instants are UTC (ISO 8601) and printed in the shop's time zone. */
export interface PaperBase {
  /** the layout this model was made for; a later layout is a new number, and old papers keep theirs */
  readonly edition: 1;
  readonly number: string;
  readonly issuedAt: string;
  readonly timeZone: string;
  readonly paperSize: PaperSize;
  readonly units: PaperUnits;
  readonly shop: ShopOnPaper;
}

/** A paper about a job in the house. */
export interface JobPaperBase extends PaperBase {
  readonly job: JobOnPaper;
  readonly customer: PartyOnPaper;
  readonly machine: MachineOnPaper;
}
