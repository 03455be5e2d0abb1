/** Words that belong to no one screen. */
export const GENERAL = {
  'general.unknown': 'Something happened that has no words yet ({code}).',
} as const
