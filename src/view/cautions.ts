/** What a plan does not settle: said wherever a plan is shown, in the page as in the report. */
export const CAUTIONS: readonly string[] = [
  "Positions are planning values, not a survey.",
  "Foundations, trenching, lightning protection, power, access to land and radio licences belong to licensed practice and local codes.",
  "A radio-quiet zone is a matter for the national spectrum authority, and so is every transmitter on the site.",
  "The phase of the atmosphere and the stability of timing limit real arrays; they are not modelled, and nor are refraction, nutation and aberration.",
];
