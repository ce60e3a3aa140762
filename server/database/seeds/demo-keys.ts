/** Short names by which the demonstration's tables speak of one another. */
export type SiteKey = 'T' | 'O' | 'P'
export type CustomerKey = 'brackwater' | 'lindmoor' | 'oriel'
