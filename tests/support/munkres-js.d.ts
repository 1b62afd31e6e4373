/** The package brings no types of its own. */
declare module 'munkres-js' {
  /** Positions (row, column) of a least-cost pairing. */
  export default function munkres(costs: number[][]): [number, number][];
}
