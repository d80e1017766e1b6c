/** Three components along the axes of a frame named where it is used. */
export type Vec3 = readonly [number, number, number];
