/**
 * GLI 2017 corrected 2020 (Stanojevic), traditional units, predicted and LLN from an independent R implementation.
 * Tolerance 1e-4 relative.
 */
export const transferFactorCheckValues = [
  {
    sex: 'female',
    ageYears: 41.25,
    heightCm: 183.8,
    expected: { dlco: [26.076154, 20.606949], kco: [4.0872523, 3.2201759], va: [6.3660157, 5.2530804] },
  },
  {
    sex: 'female',
    ageYears: 33.25,
    heightCm: 150.7,
    expected: { dlco: [19.401089, 15.437695], kco: [4.774841, 3.7743156], va: [4.1194082, 3.4124283] },
  },
  {
    sex: 'female',
    ageYears: 53.75,
    heightCm: 175.5,
    expected: { dlco: [22.972507, 17.817872], kco: [4.0726203, 3.1700648], va: [5.6337297, 4.5936958] },
  },
  {
    sex: 'female',
    ageYears: 21,
    heightCm: 150.5,
    expected: { dlco: [19.391661, 15.352969], kco: [5.0122018, 3.9149817], va: [3.9327537, 3.2516947] },
  },
  {
    sex: 'male',
    ageYears: 75,
    heightCm: 160.6,
    expected: { dlco: [20.447446, 14.908325], kco: [4.1329948, 3.0363419], va: [4.9741687, 3.9980404] },
  },
  {
    sex: 'male',
    ageYears: 49.75,
    heightCm: 179.3,
    expected: { dlco: [29.907207, 22.875947], kco: [4.4528998, 3.4437632], va: [6.7644124, 5.4996918] },
  },
  {
    sex: 'male',
    ageYears: 41.25,
    heightCm: 157.1,
    expected: { dlco: [24.095314, 18.721194], kco: [4.9180478, 3.8657256], va: [4.9351855, 4.0299652] },
  },
  {
    sex: 'male',
    ageYears: 35,
    heightCm: 197.9,
    expected: { dlco: [39.854278, 31.279837], kco: [4.6327884, 3.678919], va: [8.6530087, 7.0889215] },
  },
  {
    sex: 'male',
    ageYears: 70.75,
    heightCm: 168.2,
    expected: { dlco: [23.043969, 16.932987], kco: [4.131099, 3.0609172], va: [5.6109532, 4.5177771] },
  },
  {
    sex: 'male',
    ageYears: 39.25,
    heightCm: 186.6,
    expected: { dlco: [34.513822, 26.908005], kco: [4.6302736, 3.6521581], va: [7.5026099, 6.1328945] },
  },
] as const;
