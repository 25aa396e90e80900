/** Parts that take time or may not be wanted; the others always belong to a review. */
export const REVIEW_PARTS = ['search', 'cone', 'budget', 'itinerary', 'tolerance', 'compare'] as const
export type ReviewPart = (typeof REVIEW_PARTS)[number]
