import type { ConversionTable } from '../conversion/conversion-table.ts'

/**
 * ISO 18265:2013 Table D, high-speed steels.
 * Every second row (steps of 20 HV).
 * Read in one public file carrying the tables of ISO 18265; bracketed entries are those that this file marks as extrapolated or interpolated.
 */
export const iso18265TableD: ConversionTable = {
  name: 'ISO 18265 Table D',
  reporting: 'tenths',
  scales: ['HV', 'HRC', 'HRA', 'HR45N', 'HR30N', 'HR15N'],
  rows: [
    [580, 54.2, 77.9, 58.8, 71.7, 87.1],
    [600, 55.2, 78.5, 60, 72.6, 87.6],
    [620, 56.2, 79, 61.1, 73.5, 88.1],
    [640, 57.1, 79.6, 62.2, 74.4, 88.5],
    [660, 58, 80.1, 63.3, 75.2, 88.9],
    [680, 58.9, 80.6, 64.3, 76, 89.3],
    [700, 59.7, 81, 65.3, 76.7, 89.7],
    [720, 60.6, 81.5, 66.3, 77.4, 90.1],
    [740, 61.4, 82, 67.2, 78.1, 90.4],
    [760, 62.1, 82.4, 68.1, 78.8, 90.7],
    [780, 62.9, 82.8, 68.9, 79.5, 91],
    [800, 63.6, 83.2, 69.8, 80.1, 91.3],
    [820, 64.3, 83.6, 70.6, 80.7, 91.6],
    [840, 65, 84, 71.4, 81.3, 91.9],
    [860, 65.7, 84.4, 72.1, 81.8, 92.2],
    [880, 66.3, 84.8, 72.8, 82.4, 92.4],
    [900, 67, 85.1, 73.6, 82.9, 92.6],
    [920, 67.6, 85.5, 74.2, 83.4, 92.9],
  ],
  bracketed: {
  },
}
