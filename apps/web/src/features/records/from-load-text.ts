import { defineText } from '../../lib/text.js';

export const loadText = defineText({
  title: 'From the logger',
  load: 'Load {number} in {oven}, {day}',
  waits: 'file still to come',
  take: 'Take over {peak} and {minutes} min',
});
