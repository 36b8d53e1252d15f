/** The board's four lanes, left to right: pads, conditioning, voices, desk. */
export type LaneIndex = 0 | 1 | 2 | 3;

/** Sizes in any one unit (pixels on the board, points on paper). */
export interface ChartMetrics {
  cardWidth: number;
  /** Height of the tape with the card's name. */
  tapeHeight: number;
  /** Height of one jack row. Cards stand on a grid of it. */
  jackPitch: number;
  /** Free height between two cards of a lane, at least. */
  cardGap: number;
  /** Distance between two tracks side by side. */
  trackPitch: number;
  /** Room kept in a gutter beside outputs for the number tag. */
  outTagWidth: number;
  /** Room kept in a gutter beside inputs for number, volts and verdict. */
  inTagWidth: number;
  /** Least width of a gutter without any lead. */
  gutterMin: number;
  /** Height of a tag, for the boxes of `Track`. */
  tagHeight: number;
}

export interface ChartJack {
  id: string;
  side: "in" | "out";
}

/** A card in its lane's order. Folded, it shows its tape alone and its jacks take no room. */
export interface ChartCard {
  id: string;
  lane: LaneIndex;
  folded: boolean;
  jacks: readonly ChartJack[];
  /** Extra height under the jacks, for knobs. */
  footHeight?: number;
}

export interface ChartLead {
  id: string;
  /** Output jack. */
  from: string;
  /** Input jack. */
  to: string;
}

export interface ChartInput {
  cards: readonly ChartCard[];
  leads: readonly ChartLead[];
  metrics: ChartMetrics;
}

export interface Point {
  x: number;
  y: number;
}

export interface Box extends Point {
  width: number;
  height: number;
}

export interface PlacedCard extends Box {
  id: string;
  lane: LaneIndex;
}

export interface PlacedJack extends Point {
  id: string;
  cardId: string;
  side: "in" | "out";
}

/** One lead's way: square corners, from the output to the input. Leads of one node share their trunk. */
export interface Track {
  leadId: string;
  points: Point[];
  /** Leads with the same net are joined electrically and may lie on each other. */
  net: string;
  /** True where the input lies left of, or under, the output's own lane: draw an arrowhead at the input. */
  backward: boolean;
}

/** A tag at one end of a lead, or of several that share a jack. */
export interface Tag extends Box {
  leadIds: string[];
  jackId: string;
  end: "out" | "in";
}

export interface ChartLayout {
  width: number;
  height: number;
  cards: PlacedCard[];
  jacks: PlacedJack[];
  tracks: Track[];
  tags: Tag[];
  /** Where branches of one net meet. */
  junctions: (Point & { net: string })[];
  /** Left edge and width of each lane. */
  lanes: { x: number; width: number }[];
  /** Where the cards begin, below the upper corridors. */
  cardsTop: number;
}
