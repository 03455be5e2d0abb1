/** The space that the search, the checker and the enumerator share. */
export const LIMITS = {
  boxesInLeg: 6,
  /** Where several sources or displays are wired at once. */
  boxesInUse: 3,
  piecesInLink: 4,
  leadsInLink: 2,
  soundOnlyBoxes: 1,
  /** Label expansions, never time. */
  budget: 200_000,
  /** The same, in search of what could be bought: nobody waits for that as long as for what is there. */
  budgetOfPurchases: 50_000,
  /** Label expansions and merges, where several sources or displays are wired at once. */
  budgetOfUses: 20_000,
  hookupsShown: 12,
} as const
