import { describe, expect, it } from "vitest";
import {
  ASTM_D1141,
  alkalinityAdditionG,
  blend,
  bulkDensityForMeasuredMixGPerMl,
  calciumAdditionG,
  dechlorinatorGPerG,
  evaporation,
  exchangeContinuously,
  exchangeOnce,
  exchangeRepeatedly,
  exchangesNeeded,
  HALF_US_CUP_ML,
  heatingTime,
  type Ion,
  KESTER_1967,
  magnesiumAdditionG,
  nonNegativeLeastSquares,
  PUBLISHED_LIMITS,
  purifierPerformance,
  type Recipe,
  recipeTotals,
  referenceConstituent,
  type SaltBasis,
  type Stream,
  salinityFromMeasuredMix,
  saltCharge,
  saltForWater,
  saltToRaise,
  solveRecipe,
  timeToFillMin,
  tracerVolume,
  US_GALLON_L,
  waterToDilute,
} from "@/modules/seawater";
import { type Check, checksOf, num, proveSection, SECTION_NAMES, word } from "./seawater-checks";

const ION_OF: Readonly<Record<string, Ion>> = {
  "Na+": "Na",
  "Ca2+": "Ca",
  "Sr2+": "Sr",
  "Cl-": "Cl",
  "HCO3-": "HCO3",
  "Br-": "Br",
};

function ionOfRecipe(recipe: Recipe, check: Check) {
  const found = recipeTotals(recipe).ions.find(({ ion }) => ion === word(check, "ion"));
  if (!found) throw new Error(`${check.id}: the recipe has no ${word(check, "ion")}.`);
  return found;
}

function reference(c: Check) {
  const { gPerKg, mmolPerKg } = referenceConstituent({
    ion: ION_OF[word(c, "ion")]!,
    salinityPsu: num(c, "SP"),
  });
  return { g_kg: gPerKg, mmol_kg: mmolPerKg };
}

proveSection("8_seawater_composition_and_recipes", "composition and recipes", {
  ref_comp: reference,
  ref_comp_scaled: reference,
  astm_d1141_ion: (c) => {
    const { mmol, mg } = ionOfRecipe(ASTM_D1141, c);
    return { mmol_L: mmol, mg_L: mg };
  },
  kester_ion: (c) => {
    const { mmol, mg } = ionOfRecipe(KESTER_1967, c);
    return { mmol_kg: mmol, g_kg: mg / 1000 };
  },
});

describe("recipes as a whole", () => {
  it("Kester et al. 1967 holds 35.166 g of salt per kilogram", () => {
    expect(Math.abs(recipeTotals(KESTER_1967).saltG - 35.166)).toBeLessThanOrEqual(0.005);
  });

  it("ASTM D1141-98 holds 36.032 g of salt per litre (from memory)", () => {
    expect(recipeTotals(ASTM_D1141).saltG).toBeCloseTo(36.032, 9);
  });

  // mmol/L and mmol/kg worked out outside the project from the printed masses.
  const rows = [
    ["ASTM", "Cl", 559.53, 0.28],
    ["ASTM", "Mg", 54.62, 0.03],
    ["ASTM", "Br", 0.849, 0.001],
    ["ASTM", "B(OH)3", 0.437, 0.001],
    ["ASTM", "Sr", 0.158, 0.001],
    ["ASTM", "F", 0.0714, 0.0001],
    ["Kester", "Cl", 545.87, 0.28],
    ["Kester", "Mg", 53.27, 0.001],
    ["Kester", "Br", 0.8235, 0.0005],
    ["Kester", "B(OH)3", 0.4205, 0.0005],
    ["Kester", "Sr", 0.09, 0.0001],
    ["Kester", "F", 0.0714, 0.0001],
  ] as const;
  it.each(rows)("%s holds the right amount of %s (%d mmol)", (which, ion, wanted, tolerance) => {
    const { ions } = recipeTotals(which === "ASTM" ? ASTM_D1141 : KESTER_1967);
    expect(Math.abs(ions.find((total) => total.ion === ion)!.mmol - wanted)).toBeLessThanOrEqual(tolerance);
  });
});

describe("the recipe solver", () => {
  it("finds the masses of Kester et al. 1967 again from the ions they give", () => {
    const targets = recipeTotals(KESTER_1967).ions.map(({ ion, mmol }) => ({ ion, mmol }));
    const salts = KESTER_1967.ingredients.map(({ compound, hydrationWaters }) => ({
      compound,
      hydrationWaters,
    }));
    const solved = solveRecipe({ salts, targets });
    expect(solved.residualNormPercent).toBeLessThan(1e-7);
    const published: Record<string, number> = { NaCl: 23.926, Na2SO4: 4.008, KCl: 0.677, NaHCO3: 0.196 };
    for (const [compound, grams] of Object.entries(published)) {
      expect(solved.salts.find((salt) => salt.compound === compound)!.massG).toBeCloseTo(grams, 6);
    }
    // 0.05327 mol of MgCl2.6H2O at 203.30 g/mol (label molar mass)
    expect(solved.salts.find((salt) => salt.compound === "MgCl2")!.massG).toBeCloseTo(0.05327 * 203.3, 2);
  });

  it("agrees with scipy.optimize.nnls 1.17.1 where some columns must stay at zero", () => {
    const columns = [
      [1, 2, 0, 1],
      [0, 1, 3, -1],
      [2, 0, 1, 1],
      [1, 1, 1, 1],
      [-1, 0, 2, 4],
    ];
    SCIPY_CASES.forEach(({ b, x }) => {
      const got = nonNegativeLeastSquares(columns, b);
      got.forEach((value, i) => {
        expect(value).toBeCloseTo(x[i]!, 10);
      });
    });
  });
});

/** x of scipy.optimize.nnls (1.17.1) for the columns above. */
const SCIPY_CASES = [
  { b: [5, -1, 2, 0.5], x: [0.0, 0.03225806451612898, 2.0725806451612905, 0.0, 0.0] },
  { b: [-1, 2, -3, 4], x: [0.9743589743589742, 0.0, 0.0, 0.0, 0.3846153846153846] },
  { b: [10, 1, 0.1, 3], x: [0.7666666666666666, 0.0, 3.4666666666666677, 0.0, 0.0] },
  { b: [-1, -1, -1, -1], x: [0.0, 0.0, 0.0, 0.0, 0.0] },
  { b: [3, 7, 2, 1], x: [2.8615384615384625, 0.8307692307692309, 0.0, 0.0, 0.0] },
] as const;

const basis = (c: Check) => word(c, "basis") as SaltBasis;

proveSection("11_batch_arithmetic", "batch arithmetic", {
  salt_for_volume: (c) => {
    const charge = saltCharge({
      volumeL: num(c, "V_L"),
      salinityPsu: num(c, "SP"),
      temperatureC: num(c, "t_C"),
      moistureFraction: num(c, "moisture"),
      basis: basis(c),
    });
    return { mix_kg: charge.mixKg, water_kg: charge.waterKg, water_L: charge.waterL };
  },
  salt_into_water: (c) => {
    const charge = saltForWater({
      waterL: num(c, "V_water_L"),
      salinityPsu: num(c, "SP"),
      temperatureC: num(c, "t_C"),
      moistureFraction: num(c, "moisture"),
      basis: basis(c),
    });
    return { mix_kg: charge.mixKg, final_kg: charge.finishedKg, final_L: charge.finishedL };
  },
  dilute: (c) => {
    const { waterKg, waterL, finishedL } = waterToDilute({
      volumeL: num(c, "V_L"),
      fromSalinityPsu: num(c, "S1"),
      toSalinityPsu: num(c, "S2"),
      temperatureC: num(c, "t_C"),
    });
    return { water_kg: waterKg, water_L: waterL, final_L: finishedL };
  },
  raise: (c) => {
    const { mixKg, finishedL } = saltToRaise({
      volumeL: num(c, "V_L"),
      fromSalinityPsu: num(c, "S1"),
      toSalinityPsu: num(c, "S2"),
      temperatureC: num(c, "t_C"),
      moistureFraction: num(c, "moisture"),
      basis: basis(c),
    });
    return { mix_kg: mixKg, final_L: finishedL };
  },
  evaporation_topoff: (c) => {
    const { lostKg, topUpL } = evaporation({
      volumeL: num(c, "V_before_L"),
      fromSalinityPsu: num(c, "S1"),
      toSalinityPsu: num(c, "S2"),
      temperatureC: num(c, "t_C"),
    });
    return { water_lost_kg: lostKg, topoff_L: topUpL };
  },
  exchange_n: (c) => ({
    C: exchangeRepeatedly({
      startConcentration: num(c, "C0"),
      incomingConcentration: num(c, "C_in"),
      fraction: num(c, "fraction"),
      exchanges: num(c, "n"),
    }).concentration,
  }),
  exchange_cont: (c) => ({
    C: exchangeContinuously({
      startConcentration: num(c, "C0"),
      incomingConcentration: num(c, "C_in"),
      exchangedOverVolume: num(c, "exchanged_over_V"),
    }),
  }),
  exchanges_needed: (c) => {
    const { exactExchanges, exchanges, exchangedOverVolume } = exchangesNeeded({
      startConcentration: num(c, "C0"),
      incomingConcentration: num(c, "C_in"),
      targetConcentration: num(c, "C_target"),
      fraction: num(c, "fraction"),
    });
    return { n_exact: exactExchanges, n_whole: exchanges, continuous_over_V: exchangedOverVolume };
  },
  blend_T: (c) => {
    const streams = (c.in.streams as { V_L: number; SP: number; t_C: number }[]).map(
      ({ V_L, SP, t_C }): Stream => ({ volumeL: V_L, salinityPsu: SP, temperatureC: t_C }),
    );
    const { temperatureC, volumeWeightedTemperatureC } = blend({ streams });
    return { T_heat_capacity_weighted_C: temperatureC, T_volume_weighted_C: volumeWeightedTemperatureC };
  },
  dose_alk: (c) => {
    const grams = (additive: "NaHCO3" | "Na2CO3") =>
      alkalinityAdditionG({ volumeL: num(c, "V_L"), riseMeqPerL: num(c, "rise_meq_L"), additive });
    return { NaHCO3_g: grams("NaHCO3"), Na2CO3_g: grams("Na2CO3") };
  },
  dose_ca: (c) => {
    const grams = (additive: "CaCl2" | "CaCl2.2H2O") =>
      calciumAdditionG({ volumeL: num(c, "V_L"), riseMgPerL: num(c, "rise_mg_L"), additive });
    return { CaCl2_2H2O_g: grams("CaCl2.2H2O"), CaCl2_anhydrous_g: grams("CaCl2") };
  },
  dose_mg: (c) => {
    const grams = (additive: "MgCl2.6H2O" | "MgSO4.7H2O") =>
      magnesiumAdditionG({ volumeL: num(c, "V_L"), riseMgPerL: num(c, "rise_mg_L"), additive });
    return { MgCl2_6H2O_g: grams("MgCl2.6H2O"), MgSO4_7H2O_g: grams("MgSO4.7H2O") };
  },
  ro: (c) => {
    const { rejectionPercent, recoveryPercent, concentrate, wasteRatio } = purifierPerformance({
      feed: num(c, "feed"),
      permeate: num(c, "permeate"),
      feedFlowLPerMin: num(c, "Q_feed"),
      permeateFlowLPerMin: num(c, "Q_permeate"),
    });
    return {
      rejection_percent: rejectionPercent,
      recovery_percent: recoveryPercent,
      concentrate,
      waste_ratio: wasteRatio,
    };
  },
  fill_time: (c) => {
    const minutes = timeToFillMin({ volumeL: num(c, "V_L"), flowLPerMin: num(c, "flow_L_min") });
    return { minutes, hours: minutes / 60 };
  },
  heat_time: (c) => {
    const { energyKWh, hours } = heatingTime({
      volumeL: num(c, "V_L"),
      salinityPsu: num(c, "SP"),
      fromTemperatureC: num(c, "t1_C"),
      toTemperatureC: num(c, "t2_C"),
      powerKW: num(c, "P_kW"),
      efficiencyFraction: num(c, "efficiency"),
    });
    return { energy_kWh: energyKWh, hours };
  },
  tracer_volume: (c) => {
    const { volumeL, standardUncertaintyL, expandedUncertaintyL } = tracerVolume({
      massG: num(c, "mass_g"),
      beforeMgPerL: num(c, "C0_mg_L"),
      afterMgPerL: num(c, "C1_mg_L"),
      massUncertaintyG: num(c, "u_mass_g"),
      beforeUncertaintyMgPerL: num(c, "u_C0_mg_L"),
      afterUncertaintyMgPerL: num(c, "u_C1_mg_L"),
    });
    return { V_L: volumeL, u_V_L: standardUncertaintyL, U95_k2_L: expandedUncertaintyL };
  },
  halfcup: (c) => ({
    SP: salinityFromMeasuredMix({
      mixMl: HALF_US_CUP_ML,
      bulkDensityGPerMl: num(c, "bulk_density_g_mL"),
      waterL: US_GALLON_L,
      temperatureC: 25,
      moistureFraction: num(c, "moisture"),
      basis: basis(c),
    }),
  }),
  halfcup_density: (c) => ({
    bulk_density_g_mL: bulkDensityForMeasuredMixGPerMl({
      salinityPsu: num(c, "SP"),
      mixMl: HALF_US_CUP_ML,
      waterL: US_GALLON_L,
      temperatureC: 25,
      moistureFraction: num(c, "moisture"),
      basis: basis(c),
    }),
  }),
});

describe("common practice, no source", () => {
  it("half a US cup of mix per US gallon gives 35 only near 1.16 g/mL of dry mix, and 30 to 39 over plausible mixes", () => {
    const at = (bulkDensityGPerMl: number) =>
      salinityFromMeasuredMix({
        mixMl: HALF_US_CUP_ML,
        bulkDensityGPerMl,
        waterL: US_GALLON_L,
        temperatureC: 25,
        basis: "nominal",
      });
    expect(at(1.157)).toBeCloseTo(35, 1);
    const wanted = [30.4, 33.3, 36.2, 39.2];
    [1, 1.1, 1.2, 1.3].forEach((density, i) => {
      expect(Math.abs(at(density) - wanted[i]!)).toBeLessThanOrEqual(0.06);
    });
  });

  it("a 10 % change moves a parameter by a tenth of the difference", () => {
    expect(exchangeOnce({ startConcentration: 50, incomingConcentration: 10, fraction: 0.1 })).toBe(46);
  });

  it("about 2.5 parts of ascorbic acid, and 7 of thiosulfate pentahydrate, take up one part of chlorine", () => {
    expect(Math.abs(dechlorinatorGPerG("ascorbic-acid") - 2.5)).toBeLessThan(0.05);
    expect(Math.abs(dechlorinatorGPerG("thiosulfate-to-tetrathionate") - 7)).toBeLessThan(0.05);
  });
});

describe("published limits and targets", () => {
  const rows = checksOf("12_limits_and_targets");
  for (const check of rows) {
    it(`${check.id} ${word(check, "quantity")} is kept as published (${check.prov}: ${check.src})`, () => {
      const kept = PUBLISHED_LIMITS.find(({ quantity }) => quantity === word(check, "quantity"));
      expect(kept?.value).toEqual(check.out.value);
      expect(kept?.unit).toBe(check.out.unit);
      expect(kept?.fromMemory).toBe(check.prov === "memory");
    });
  }

  it("holds no limit without a source row", () => {
    expect(PUBLISHED_LIMITS).toHaveLength(rows.length);
  });
});

it("every section of the reference is proven by one of these files", () => {
  expect(SECTION_NAMES).toEqual([
    "1_practical_salinity_pss78",
    "2_density_eos80_and_specific_gravity",
    "3_refractive_index",
    "4_dissolved_oxygen_saturation",
    "5_unionized_ammonia",
    "6_carbonate_system",
    "7_unit_conversions",
    "8_seawater_composition_and_recipes",
    "9_specific_heat",
    "10_freezing_point",
    "11_batch_arithmetic",
    "12_limits_and_targets",
  ]);
});
