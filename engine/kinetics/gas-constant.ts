/** Molar gas constant, J/(mol K); exact since 2019 (BIPM, The International System of Units, 9th edition). */
export const gasConstant = 8.31446261815324
