import type { CONTAMINATIONS } from '@shared/jobs';
import type { Route, Step } from '@shared/route';
import type { JobPaperBase, PaperBase } from './paper-model.js';

/** What the customer takes away when the machine stays. */
export interface AcknowledgementModel extends JobPaperBase {
  readonly kind: 'acknowledgement';
  readonly route: Route;
  readonly receivedAt: string;
  readonly receivedBy: string;
  readonly complaint: string;
  readonly accessories: string;
  readonly contamination: (typeof CONTAMINATIONS)[number];
  readonly contaminationWords: string;
  /** YYYY-MM-DD; null where nothing was promised */
  readonly promisedOn: string | null;
  /** where the job can be looked at; null where the customer has no portal user */
  readonly jobUrl: string | null;
  /** the shop's conditions in its own words; '' prints nothing */
  readonly conditions: string;
}

/** The label tied to the machine, 100 by 62 mm. */
export interface TagModel extends PaperBase {
  readonly kind: 'tag';
  readonly jobNumber: string;
  readonly customerName: string;
  readonly machineDescription: string;
  readonly serial: string;
  readonly route: Route;
  readonly step: Step;
  readonly receivedAt: string;
  readonly promisedOn: string | null;
  /** what hangs on the tag where it is not the whole machine: 'Rotor', 'Bin 3' */
  readonly part: string;
  /** opens the job on a tablet */
  readonly jobUrl: string;
  /** cautions that travel with the machine: 'Asbestos suspected' */
  readonly caution: string;
}

export interface DeliveryItem {
  readonly description: string;
  readonly quantity: string;
  readonly remark: string;
}

export interface DeliveryNoteModel extends JobPaperBase {
  readonly kind: 'delivery-note';
  readonly items: readonly DeliveryItem[];
  readonly releasedAt: string;
  readonly releasedBy: string;
  /** '' where it is not yet collected: the line stays open for the pen */
  readonly collectedBy: string;
  readonly certificateNumber: string | null;
  readonly remark: string;
}
