/** `station-move`: a station is on its way (`drag`), put down (`drop`) or put back (`cancel`). */
export interface StationMove {
  readonly id: string;
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
  /** The height it stands at: its own while it is moved, another one only where a height was typed. */
  readonly heightM: number;
  readonly phase: "drag" | "drop" | "cancel";
}

/** `station-pick`: the selection asked for; null for none. */
export interface StationPick {
  readonly id: string | null;
}

export const stationMove = (detail: StationMove): CustomEvent<StationMove> =>
  new CustomEvent("station-move", { detail, bubbles: true, composed: true });

export const stationPick = (id: string | null): CustomEvent<StationPick> =>
  new CustomEvent("station-pick", { detail: { id }, bubbles: true, composed: true });

declare global {
  interface HTMLElementEventMap {
    "station-move": CustomEvent<StationMove>;
    "station-pick": CustomEvent<StationPick>;
  }
}
