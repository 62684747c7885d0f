import type { RecordDecision } from '@shared/waivers';
import { t as jobText } from './text.js';
import { t } from './work-text.js';

/** What a customer can be asked: before the strip the repair itself, after it the core as it is now. */
export const CHOICES: Record<RecordDecision['about'], readonly RecordDecision['choice'][]> = {
  'core-test-before': ['go-on', 'repair-and-retest', 'replace', 'return-unrepaired'],
  'core-test-after': ['repair-and-retest', 'accept-with-concession', 'replace', 'return-unrepaired'],
};

const ALL = new Set<string>(Object.values(CHOICES).flat());
export const choiceName = (choice: unknown): string => (typeof choice === 'string' && ALL.has(choice) ? t(choice as RecordDecision['choice']) : String(choice ?? ''));

const CHANNELS = new Set(['phone', 'e-mail', 'in-person', 'portal']);
export const channelName = (channel: unknown): string => (typeof channel === 'string' && CHANNELS.has(channel) ? jobText(channel as RecordDecision['channel']) : String(channel ?? ''));
