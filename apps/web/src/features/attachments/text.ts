import { defineText } from '../../lib/text.js';

export const t = defineText({
  title: 'Photos and scanned papers',
  drop: 'Drop files here, or',
  choose: 'Choose files',
  camera: 'Take a photo',
  accepts: 'PNG, JPEG, WebP or PDF.',
  sending: 'Sending {name}…',
  waiting: 'Waits its turn: {name}',
  failed: '{name}: {words}',
  retry: 'Try again',
  dismiss: 'Take it off the list',
  sent: '{name} is here.',
  empty: 'No photos yet',
  emptyHelp: 'Photograph the plate, the leads, the damage: before the first bolt is turned.',
  mayNot: 'Your role does not add photos.',
  open: 'Open {name}',
  by: '{who}, {when}, {size}',
  gallery: 'Photos and scans of this job',
  kindRefused: 'This is no picture and no PDF. Send it as PNG, JPEG, WebP or PDF.',
  tooLarge: 'This file has {size}; at most 15 MB are taken.',
});
