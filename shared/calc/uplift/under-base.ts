/** Head under the base at one moment, per unit weight of water. */
export interface HeadUnderBase {
  /** ∫ head dx over the base [m²]: U/(ρ g). */
  readonly force: number
  /** First moment of it about the dry toe [m³]. */
  readonly moment: number
  /** True where the falling water lets the skirt vent somewhere. */
  readonly isVented: boolean
  /** ∫ head dx over the first `length` metres from the wet edge [m²]. */
  readonly upTo: (length: number) => number
}
