/** A limit or target that somebody published: a help when a facility sets its own, never in force by itself. */
export interface PublishedLimit {
  quantity: string;
  /** one bound, a range, or a frequency in words */
  value: number | readonly [number, number] | string;
  unit: string;
  source: string;
  /** true where we recall it and have not seen the source again */
  fromMemory: boolean;
}

/** Published limits and targets for marine systems, each with its source. Local law goes before all of them. */
export const PUBLISHED_LIMITS: readonly PublishedLimit[] = [
  {
    quantity: "coliform bacteria, primary enclosure pool, marine mammals (US)",
    value: 1000,
    unit: "MPN/100 mL, not to exceed",
    source: "9 CFR 3.106(b)(1)",
    fromMemory: false,
  },
  {
    quantity: "coliform test frequency, marine mammals (US)",
    value: "at least weekly",
    unit: "",
    source: "9 CFR 3.106(b)(3)",
    fromMemory: false,
  },
  {
    quantity: "un-ionized ammonia, marine, acute (1-h)",
    value: 0.233,
    unit: "mg/L NH3",
    source: "WAC 173-201A-240; US EPA 440/5-88-004 (1989)",
    fromMemory: false,
  },
  {
    quantity: "total residual chlorine, marine, acute",
    value: 13,
    unit: "ug/L",
    source: "WAC 173-201A-240; US EPA saltwater criterion for chlorine-produced oxidants",
    fromMemory: false,
  },
  {
    quantity: "copper, saltwater acute (CMC)",
    value: 4.8,
    unit: "ug/L dissolved",
    source: "US EPA National Recommended Water Quality Criteria",
    fromMemory: true,
  },
  {
    quantity: "ozone-produced oxidants, maximum safe chronic exposure, juvenile Litopenaeus vannamei",
    value: 0.06,
    unit: "mg/L chlorine equivalent",
    source: "Schroeder, Gaertner, Waller & Hanel 2010, Aquaculture 305, 6-11",
    fromMemory: false,
  },
  {
    quantity: "calcium, reef aquaria recommendation",
    value: [380, 450],
    unit: "ppm",
    source: "Holmes-Farley, reef aquarium parameters, table 1",
    fromMemory: false,
  },
  {
    quantity: "magnesium, reef aquaria recommendation",
    value: [1250, 1350],
    unit: "ppm",
    source: "Holmes-Farley, reef aquarium parameters, table 1",
    fromMemory: false,
  },
  {
    quantity: "temperature, reef aquaria",
    value: [76, 83],
    unit: "degF",
    source: "Holmes-Farley, reef aquarium parameters, table 1",
    fromMemory: false,
  },
  {
    quantity: "salinity, many public aquarium marine systems",
    value: [28, 35],
    unit: "g/L",
    source: "Hadfield 2021, Clinical Guide to Fish Medicine, appendix A2",
    fromMemory: false,
  },
  {
    quantity: "un-ionized ammonia, toxicity begins",
    value: 0.05,
    unit: "mg/L",
    source: "Fundamentals of Aquatic Veterinary Medicine",
    fromMemory: false,
  },
  {
    quantity: "total ammonia nitrogen, upper guideline, marine aquaria",
    value: 0.1,
    unit: "mg/L NH4-N",
    source: "Spotte 1979, Seawater Aquariums",
    fromMemory: true,
  },
  {
    quantity: "nitrate nitrogen, upper guideline, marine aquaria",
    value: 20,
    unit: "mg/L NO3-N",
    source: "Spotte 1979, Seawater Aquariums",
    fromMemory: true,
  },
];
