/**
 * Advance widths of Source Sans 3, in thousandths of the size, for the characters from space to tilde.
 * Measured from the font that ships with the app; a drawing must know its words' widths before it is drawn.
 */
const WIDTHS: Readonly<Record<Weight, readonly number[]>> = {
  400: [
    200, 289, 426, 497, 497, 824, 609, 249, 303, 303, 418, 497, 249, 311, 249, 350, 497, 497, 497,
    497, 497, 497, 497, 497, 497, 497, 249, 249, 497, 497, 497, 425, 847, 543, 588, 571, 615, 527,
    494, 617, 652, 263, 479, 579, 486, 727, 647, 664, 566, 664, 569, 534, 536, 645, 515, 786, 513,
    476, 539, 303, 350, 303, 497, 500, 542, 504, 553, 456, 555, 496, 292, 504, 544, 246, 247, 495,
    255, 829, 547, 542, 555, 555, 347, 419, 338, 544, 467, 719, 446, 467, 425, 303, 241, 303, 497,
  ],
  600: [
    200, 315, 482, 513, 513, 841, 639, 275, 324, 324, 438, 513, 275, 322, 275, 344, 513, 513, 513,
    513, 513, 513, 513, 513, 513, 513, 275, 275, 513, 513, 513, 444, 875, 558, 597, 576, 625, 538,
    510, 628, 663, 282, 494, 597, 502, 745, 657, 674, 582, 674, 592, 545, 546, 655, 536, 800, 541,
    501, 540, 324, 344, 324, 513, 500, 549, 516, 563, 462, 564, 507, 317, 520, 558, 262, 263, 522,
    271, 843, 560, 549, 564, 564, 373, 431, 361, 556, 495, 748, 481, 495, 443, 324, 255, 324, 513,
  ],
  700: [
    200, 340, 537, 528, 528, 857, 667, 300, 344, 344, 457, 528, 300, 332, 300, 339, 528, 528, 528,
    528, 528, 528, 528, 528, 528, 528, 300, 300, 528, 528, 528, 463, 902, 573, 605, 582, 635, 548,
    524, 638, 674, 301, 509, 614, 518, 762, 665, 684, 596, 684, 613, 556, 556, 665, 556, 813, 567,
    525, 541, 344, 339, 344, 528, 500, 555, 527, 573, 468, 573, 518, 341, 534, 571, 276, 278, 548,
    286, 857, 572, 555, 573, 573, 398, 443, 383, 568, 523, 776, 514, 521, 460, 344, 268, 344, 528,
  ],
}

export type Weight = 400 | 600 | 700
export type TextSize = 12 | 14 | 16

/** Characters outside the table are taken as wide as a capital O with a little to spare. */
const OTHER = 720

const advance = (char: string, weight: Weight): number =>
  WIDTHS[weight][(char.codePointAt(0) ?? 0) - 32] ?? OTHER

/** Width in pixels of a line of text. */
export const textWidth = (text: string, size: TextSize, weight: Weight): number =>
  ([...text].reduce((sum, char) => sum + advance(char, weight), 0) * size) / 1000

/** Breaks text into lines no wider than `width`; a single long word keeps its line. */
export function wrapText(text: string, size: TextSize, weight: Weight, width: number): string[] {
  const lines: string[] = []
  for (const word of text.split(' ')) {
    const last = lines.at(-1)
    const joined = last === undefined ? word : `${last} ${word}`
    if (last !== undefined && textWidth(joined, size, weight) <= width)
      lines[lines.length - 1] = joined
    else lines.push(word)
  }
  return lines
}

/** Cuts text to a width, with an ellipsis where something was cut. */
export function cutText(text: string, size: TextSize, weight: Weight, width: number): string {
  if (textWidth(text, size, weight) <= width) return text
  const chars = [...text]
  while (chars.length > 1 && textWidth(`${chars.join('')}…`, size, weight) > width) chars.pop()
  return `${chars.join('').trimEnd()}…`
}
