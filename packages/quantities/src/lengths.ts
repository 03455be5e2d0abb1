import { foot, metre, type Foot, type Metre } from './units'

/** Metres in a foot; exact (international yard and pound agreement, 1959). */
const METRES = 0.3048

export const footToMetre = (length: Foot): Metre => metre(length * METRES)

/** Inverse of {@link footToMetre}. */
export const metreToFoot = (length: Metre): Foot => foot(length / METRES)
