/** Line drawings on a grid of 20, drawn for this app; a line of 1.5 does for all of them. */
export const ICONS = {
  hookups:
    'M5.5 6.5V13q0 3 3 3h3q3 0 3 -3V6.5M5.5 2a2.3 2.3 0 1 0 .01 0M14.5 2a2.3 2.3 0 1 0 .01 0',
  shelf: 'M2 2V18M18 2V18M2 9.5H18M2 16H18M5 9.5V5.5H10V9.5M7 16V12.5H13V16',
  models: 'M4 2H16V18H4ZM7 6H13M7 9H13M7 12H10',
  search: 'M8.5 3a5.5 5.5 0 1 0 .01 0M12.6 12.6L17 17',
  help: 'M10 2a8 8 0 1 0 .01 0M7.6 7.8q.2 -2.2 2.4 -2.2t2.4 2q0 1.4 -1.4 2.2t-1 1.9M10 14.2V14.4',
  moon: 'M8 2.6A7.6 7.6 0 1 0 17.4 12A7 7 0 0 1 8 2.6Z',
  sun: 'M10 6a4 4 0 1 0 .01 0M10 1V3M10 17V19M1 10H3M17 10H19M3.6 3.6L5 5M15 15L16.4 16.4M3.6 16.4L5 15M15 5L16.4 3.6',
  print: 'M5.5 7V2.5H14.5V7M5.5 14H2.5V7H17.5V14H14.5M5.5 11.5H14.5V17.5H5.5Z',
  plus: 'M10 3V17M3 10H17',
  close: 'M4.5 4.5L15.5 15.5M15.5 4.5L4.5 15.5',
  back: 'M12.5 3.5L6 10L12.5 16.5',
  down: 'M4.5 7.5L10 13L15.5 7.5',
  up: 'M4.5 12.5L10 7L15.5 12.5',
  more: 'M4 10h.01M10 10h.01M16 10h.01',
  filter: 'M3 5H17M5.5 10H14.5M8.5 15H11.5',
  warning: 'M10 2.5L18.5 17.5H1.5ZM10 8V12.5M10 14.8V15',
  edit: 'M3 17L4 13L13.5 3.5L16.5 6.5L7 16ZM11.5 5.5L14.5 8.5',
  undo: 'M4 8H12a4.5 4.5 0 0 1 0 9H8M7.5 4.5L4 8L7.5 11.5',
  words: 'M3 4H17V14H9L5.5 17V14H3ZM6 7.5H14M6 10.5H11',
  door: 'M8 3H3.5V17H8M7 10H17M13.5 6.5L17 10L13.5 13.5',
} as const

export type IconName = keyof typeof ICONS
