/** Molar gas constant, J/(mol K): exact since 2019 as the product of the defining constants k and N_A (SI Brochure, 9th ed.). */
export const GAS_CONSTANT = 8.31446261815324;
