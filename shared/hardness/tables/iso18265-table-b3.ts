import type { ConversionTable } from '../conversion/conversion-table.ts'

/**
 * ISO 18265:2013 Table B.3, the same steels hardened.
 * Read in one public file carrying the tables of ISO 18265; bracketed entries are those that this file marks as extrapolated or interpolated.
 */
export const iso18265TableB3: ConversionTable = {
  name: 'ISO 18265 Table B.3',
  reporting: 'tenths',
  scales: ['HV', 'HBW', 'HRC', 'HRA', 'HR45N', 'HR30N', 'HR15N'],
  rows: [
    [580, 572, 54, 78.1, 59.5, 71.4, 87.2],
    [590, 576, 54.4, 78.4, 59.6, 71.9, 87.4],
    [600, 580, 54.8, 78.6, 59.9, 72.3, 87.6],
    [610, 585, 55.2, 78.8, 60.2, 72.8, 87.8],
    [620, 591, 55.6, 79.1, 60.5, 73.2, 88],
    [630, 597, 56.1, 79.3, 60.9, 73.6, 88.2],
    [640, 604, 56.5, 79.6, 61.4, 74.1, 88.4],
    [650, 611, 56.9, 79.8, 61.8, 74.5, 88.7],
    [660, 619, 57.4, 80.1, 62.4, 75, 88.9],
    [670, 627, 57.8, 80.3, 63, 75.4, 89.1],
    [680, 636, 58.3, 80.6, 63.6, 75.8, 89.4],
    [690, 646, 58.7, 80.9, 64.2, 76.2, 89.6],
    [700, 656, 59.2, 81.1, 64.9, 76.7, 89.8],
    [710, 666, 59.7, 81.4, 65.6, 77.1, 90.1],
    [720, 677, 60.1, 81.7, 66.4, 77.5, 90.3],
  ],
  bracketed: {
  },
}
