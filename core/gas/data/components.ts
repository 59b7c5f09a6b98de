import { GAS_CONSTANT } from '../../numeric/gas-constant.ts';

/** A pure substance that a gas may hold. */
export interface Component {
  /** As sheets and reports write it: `n_butane`. */
  readonly id: string;
  readonly name: string;
  readonly formula: string;
  /** Other names by which sheets may call it; case, spaces, hyphens and underscores do not count. */
  readonly synonyms: readonly string[];
  /** Molar mass, g/mol. */
  readonly molarMass: number;
  /** Coefficients a_k of the molar heat capacity as an ideal gas: c_p = sum of a_k (T / 1000 K)^k, J/(mol K). */
  readonly heatCapacity: readonly number[];
}

/** Temperatures between which the heat capacities hold, K. */
export const HEAT_CAPACITY_RANGE = { from: 200, to: 600 } as const;

/** Helium and argon: 5/2 R at all temperatures. */
const MONATOMIC = [2.5 * GAS_CONSTANT];

/**
 * Molar masses: those of the published reference equation of state of each fluid, as carried by the open-source library
 * CoolProp 8.0.0. Heat capacities: fitted (relative least squares, 200 to 600 K) to the ideal-gas part of the same
 * equations; the largest error of a fit is 0.12 % (n-heptane, n-octane), and below 0.08 % for all others.
 */
// prettier-ignore
export const COMPONENTS: readonly Component[] = [
  { id: 'methane', name: 'methane', formula: 'CH4', synonyms: ['CH4', 'C1'], molarMass: 16.0428, heatCapacity: [37.1764157, -23.1251107, -134.069653, 1136.96606, -1933.83394, 1061.14691] },
  { id: 'ethane', name: 'ethane', formula: 'C2H6', synonyms: ['C2H6', 'C2'], molarMass: 30.06904, heatCapacity: [44.8468552, -139.0405, 810.204165, -920.970131, 104.555365, 276.192785] },
  { id: 'propane', name: 'propane', formula: 'C3H8', synonyms: ['C3H8', 'C3', 'R290'], molarMass: 44.09562, heatCapacity: [51.8195677, -160.76396, 1206.24572, -1587.74738, 462.560867, 279.687372] },
  { id: 'isobutane', name: 'isobutane', formula: 'C4H10', synonyms: ['iC4', 'i-butane', '2-methylpropane', 'R600a'], molarMass: 58.1222, heatCapacity: [48.6385016, -17.0978297, 741.166105, -56.0160587, -1901.95565, 1592.42026] },
  { id: 'n_butane', name: 'n-butane', formula: 'C4H10', synonyms: ['nC4', 'R600'], molarMass: 58.1222, heatCapacity: [81.7679595, -334.137864, 2107.24651, -3180.01134, 1701.05251, -53.0628863] },
  { id: 'isopentane', name: 'isopentane', formula: 'C5H12', synonyms: ['iC5', 'i-pentane', '2-methylbutane'], molarMass: 72.14878, heatCapacity: [13.7477026, 388.482103, -352.464025, 1400.95473, -2523.33623, 1471.25268] },
  { id: 'n_pentane', name: 'n-pentane', formula: 'C5H12', synonyms: ['nC5'], molarMass: 72.14878, heatCapacity: [129.682791, -830.461492, 4891.09831, -10099.2049, 10231.1284, -4215.16255] },
  { id: 'neopentane', name: 'neopentane', formula: 'C5H12', synonyms: ['neoC5', '2,2-dimethylpropane'], molarMass: 72.14878, heatCapacity: [-42.6793088, 843.074889, -1516.37859, 2271.35007, -1838.89003, 577.109526] },
  { id: 'n_hexane', name: 'n-hexane', formula: 'C6H14', synonyms: ['C6H14', 'nC6', 'hexane'], molarMass: 86.17536, heatCapacity: [188.667168, -1378.31001, 7292.21382, -14087.5394, 12744.6311, -4461.57455] },
  { id: 'n_heptane', name: 'n-heptane', formula: 'C7H16', synonyms: ['C7H16', 'nC7', 'heptane'], molarMass: 100.202, heatCapacity: [106.403952, -110.535131, 951.420545, 1782.09075, -6405.90059, 4504.55416] },
  { id: 'n_octane', name: 'n-octane', formula: 'C8H18', synonyms: ['C8H18', 'nC8', 'octane'], molarMass: 114.229, heatCapacity: [58.3723619, 661.527969, -2604.34911, 10276.5593, -16249.9374, 8948.81875] },
  { id: 'n_nonane', name: 'n-nonane', formula: 'C9H20', synonyms: ['C9H20', 'nC9', 'nonane'], molarMass: 128.2551, heatCapacity: [230.771729, -1537.60266, 8920.07822, -17990.8408, 17469.638, -6832.80846] },
  { id: 'n_decane', name: 'n-decane', formula: 'C10H22', synonyms: ['C10H22', 'nC10', 'decane'], molarMass: 142.28168, heatCapacity: [249.940611, -1620.71358, 9387.67078, -18489.1824, 17364.5832, -6534.9012] },
  { id: 'ethylene', name: 'ethylene', formula: 'C2H4', synonyms: ['C2H4', 'ethene', 'R1150'], molarMass: 28.05376, heatCapacity: [55.1341875, -331.164743, 1679.05022, -3084.73241, 2665.70254, -893.197305] },
  { id: 'propylene', name: 'propylene', formula: 'C3H6', synonyms: ['C3H6', 'propene', 'R1270'], molarMass: 42.07974, heatCapacity: [37.4370582, -19.5427919, 504.935517, -354.321972, -504.113207, 545.31762] },
  { id: 'benzene', name: 'benzene', formula: 'C6H6', synonyms: ['C6H6'], molarMass: 78.1118, heatCapacity: [87.5344601, -858.017952, 5160.23871, -10479.7925, 9756.73409, -3486.48577] },
  { id: 'nitrogen', name: 'nitrogen', formula: 'N2', synonyms: ['N2'], molarMass: 28.01348, heatCapacity: [28.6881654, 5.29809666, -22.2306085, 28.1001797, 20.8944566, -32.5810484] },
  { id: 'carbon_dioxide', name: 'carbon dioxide', formula: 'CO2', synonyms: ['CO2', 'R744'], molarMass: 44.0098, heatCapacity: [27.7287928, -35.6604808, 510.141339, -1383.74449, 1668.36964, -771.524925] },
  { id: 'hydrogen_sulfide', name: 'hydrogen sulfide', formula: 'H2S', synonyms: ['H2S', 'hydrogen sulphide'], molarMass: 34.08088, heatCapacity: [35.9091618, -31.7023156, 114.1732, -90.5122106, -28.7471895, 55.3180536] },
  { id: 'hydrogen', name: 'hydrogen', formula: 'H2', synonyms: ['H2'], molarMass: 2.01588, heatCapacity: [9.31905813, 187.894693, -717.607243, 1383.47295, -1344.5956, 527.811388] },
  { id: 'helium', name: 'helium', formula: 'He', synonyms: ['He'], molarMass: 4.002602, heatCapacity: MONATOMIC },
  { id: 'argon', name: 'argon', formula: 'Ar', synonyms: ['Ar'], molarMass: 39.948, heatCapacity: MONATOMIC },
  { id: 'oxygen', name: 'oxygen', formula: 'O2', synonyms: ['O2'], molarMass: 31.9988, heatCapacity: [28.1862088, 19.6394732, -149.699546, 494.378868, -658.861073, 316.617182] },
  { id: 'water', name: 'water', formula: 'H2O', synonyms: ['H2O', 'steam', 'water vapour'], molarMass: 18.015268, heatCapacity: [32.3760591, 18.5929983, -134.817012, 434.060362, -569.194823, 274.433995] },
  { id: 'carbon_monoxide', name: 'carbon monoxide', formula: 'CO', synonyms: ['CO'], molarMass: 28.0101, heatCapacity: [28.2393759, 12.3837719, -64.4399837, 142.878021, -116.027371, 27.5578818] },
  { id: 'ammonia', name: 'ammonia', formula: 'NH3', synonyms: ['NH3', 'R717'], molarMass: 17.03052, heatCapacity: [42.1013519, -121.666406, 563.767789, -998.953059, 852.269477, -278.964657] },
  { id: 'sulfur_dioxide', name: 'sulfur dioxide', formula: 'SO2', synonyms: ['SO2', 'sulphur dioxide'], molarMass: 64.0638, heatCapacity: [29.9941976, 30.9842504, -15.3896223, 164.800549, -363.26943, 224.668727] },
  { id: 'r22', name: 'R22', formula: 'CHClF2', synonyms: ['chlorodifluoromethane'], molarMass: 86.468, heatCapacity: [26.5527339, 70.2095184, 206.57327, -429.797012, 208.219505, 30.8795153] },
  { id: 'r32', name: 'R32', formula: 'CH2F2', synonyms: ['difluoromethane'], molarMass: 52.024, heatCapacity: [39.5615939, -86.5936663, 406.464827, -102.471545, -713.388833, 606.06315] },
  { id: 'r125', name: 'R125', formula: 'C2HF5', synonyms: ['pentafluoroethane'], molarMass: 120.0214, heatCapacity: [23.1095594, 303.712343, -340.571467, 719.319335, -1240.16288, 758.046962] },
  { id: 'r134a', name: 'R134a', formula: 'C2H2F4', synonyms: ['1,1,1,2-tetrafluoroethane'], molarMass: 102.032, heatCapacity: [12.389344, 347.070612, -540.378008, 860.459053, -804.668146, 320.848351] },
  { id: 'r143a', name: 'R143a', formula: 'C2H3F3', synonyms: ['1,1,1-trifluoroethane'], molarMass: 84.041, heatCapacity: [17.9261177, 211.703918, 48.3044278, -344.162766, 242.222338, -20.59155] },
  { id: 'r152a', name: 'R152a', formula: 'C2H4F2', synonyms: ['1,1-difluoroethane'], molarMass: 66.051, heatCapacity: [27.8946428, 91.3468614, 207.996057, -231.761248] },
  { id: 'r1234yf', name: 'R1234yf', formula: 'C3H2F4', synonyms: ['2,3,3,3-tetrafluoropropene'], molarMass: 114.0416, heatCapacity: [9.7570358, 468.030588, -966.630773, 2235.75329, -3183.49919, 1746.61586] },
];
