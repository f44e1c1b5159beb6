/** Advance widths of Public Sans Regular from space to tilde, in thousandths of the font size; read from the font file. */
const advances = [
  243, 251, 426, 603, 659, 904, 709, 248, 303, 309, 394, 555, 242, 378, 225, 351, 612, 407, 596,
  630, 629, 641, 623, 601, 648, 625, 226, 240, 546, 555, 546, 521, 831, 710, 671, 689, 694, 621,
  594, 733, 766, 283, 389, 682, 578, 886, 754, 734, 637, 748, 677, 670, 594, 701, 673, 954, 688,
  607, 637, 303, 351, 303, 473, 518, 219, 553, 597, 544, 597, 567, 396, 623, 577, 248, 263, 562,
  303, 865, 577, 566, 596, 596, 391, 506, 389, 581, 505, 780, 565, 535, 481, 328, 263, 332, 568,
];

/** For characters beyond ASCII: a wide letter, so that the estimate is rather too long than too short. */
const otherAdvance = 720;

/** SemiBold runs about 3 % wider in text, single letters more. */
const semiBoldFactor = 1.05;

/**
 * How wide a line of Public Sans will be, in the unit of its size; for placing labels where no
 * browser can measure them.
 */
export function estimateTextWidth(text: string, fontSize: number, weight: 400 | 600 = 400): number {
  let thousandths = 0;
  for (const character of text) {
    thousandths += advances[(character.codePointAt(0) ?? 0) - 32] ?? otherAdvance;
  }
  return (thousandths / 1000) * fontSize * (weight === 600 ? semiBoldFactor : 1);
}
