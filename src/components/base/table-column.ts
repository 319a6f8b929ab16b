/** One column of a table; its cell is the slot named like its id. */
export interface TableColumn {
  readonly id: string
  readonly label: string
  /** Figures stand right-aligned. */
  readonly isFigure?: boolean
  readonly isSortable?: boolean
  /** Keeps the head for screen readers, as over buttons. */
  readonly isHeadHidden?: boolean
}

export interface TableOrder {
  readonly sort: string
  readonly order: 'asc' | 'desc'
}
