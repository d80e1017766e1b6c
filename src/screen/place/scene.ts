import type { GeoGeometryObjects } from "d3-geo";
import type { Lift } from "../../view/ground/lift.ts";
import type { PlaceModel } from "../../view/ground/model.ts";
import type { ScreenPoints } from "../../view/ground/pick.ts";
import type { Sheet } from "../../view/ground/sheet.ts";
import type { Palette } from "./palette.ts";

/** Everything one painting of the map needs. Pixels are CSS pixels; the context is scaled to the device. */
export interface Scene {
  readonly model: PlaceModel;
  readonly sheet: Sheet;
  /** Stations of the layout, then candidates; a lifted one where it is now. */
  readonly points: ScreenPoints;
  readonly lift: Lift | null;
  /** Land of the globe; null on a local sheet and until it is loaded. */
  readonly coast: GeoGeometryObjects | null;
  readonly palette: Palette;
}

/** Text on the map is set in one size. */
export const mapFont = (palette: Palette, weight: number, sizePx = 11): string => `${weight} ${sizePx}px ${palette.font}`;
