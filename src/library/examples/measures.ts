import { protectionOf, ruzeFactor, sefdJy, zenithOpacity } from "spanwright/measures";

// A 12 m dish with a surface of 0.3 mm rms at 43 GHz.
const efficiency = 0.72 * ruzeFactor(0.0003, 299_792_458 / 43e9);
console.log(`SEFD ${sefdJy(45, 12, efficiency).toFixed(0)} Jy`);

// Clear air over a site at 2360 m, with 4 g/m³ of vapour at sea level.
console.log(`zenith opacity ${zenithOpacity(43e9, 2360, 4).toFixed(3)}`);

const { fraction } = protectionOf(42.5e9, 43.5e9);
console.log(`${(100 * fraction).toFixed(0)} % of the band is protected`);
// prints: SEFD 2044 Jy
// prints: zenith opacity 0.058
// prints: 100 % of the band is protected
