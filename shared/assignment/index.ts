/** The pairing engine's public surface; see README.md. */
export * from './problem';
export * from './reduction';
export { problemFromMatrix } from './matrix';
export { solve } from './solve';
export { verify, type Verdict } from './certificate';
export { largestPairing, type LargestPairing } from './cardinality';
export { priceOfBarring, priceOfChoice, priceOfPartner, pricesOfPartners, type Change, type Price } from './price';
export { tradeOff, type TradeOffPoint } from './trade-off';
export { repairWithout, standbys } from './standbys';
export { steadiness } from './steadiness';
export { explainShortage, isPerfectOnBothSides, leftOutByChoice, smallestReason, type ShortageGroup } from './shortage';
export { gainFromNewMentor, gainFromPairs, gainFromPlaces, gainWithoutLock, mentorsWhosePlaceHelps } from './remedies';
export { blockingPairs } from './stability';
