import type { Random } from './random';
import type { Sex } from '@slighthill/api/physiology/reference-sets/index';

// Invented combinations; any likeness to a living person is chance.
const givenNames: Record<Sex, readonly string[]> = {
  male: [
    'Alden',
    'Bram',
    'Corwin',
    'Dario',
    'Edmar',
    'Fenton',
    'Garrick',
    'Hollis',
    'Ivo',
    'Jarrod',
    'Kellan',
    'Lorcan',
    'Matteo',
    'Niall',
    'Osric',
    'Percy',
    'Quill',
    'Rafael',
    'Stellan',
    'Tobias',
    'Ulises',
    'Verner',
    'Weldon',
    'Yorick',
  ],
  female: [
    'Adela',
    'Brenna',
    'Cosima',
    'Delphine',
    'Elspeth',
    'Fenna',
    'Greer',
    'Hedda',
    'Ilse',
    'Junia',
    'Katya',
    'Linnea',
    'Marisol',
    'Nerys',
    'Odile',
    'Petronella',
    'Rosalind',
    'Sunniva',
    'Thea',
    'Ursula',
    'Viola',
    'Wilda',
    'Ximena',
    'Zelda',
  ],
};

const familyNames = [
  'Abernook',
  'Ashgrove',
  'Barrowmead',
  'Birchall',
  'Calderwick',
  'Cobbett',
  'Dunmarrow',
  'Easterly',
  'Elmhirst',
  'Farthingale',
  'Fennimark',
  'Garrowby',
  'Greenhalt',
  'Hartsong',
  'Hollowell',
  'Ingerby',
  'Ironmonger',
  'Jessamy',
  'Kestrow',
  'Kirkmoss',
  'Lambertine',
  'Larkhill',
  'Marchetto',
  'Millthorn',
  'Netherby',
  'Northcroft',
  'Oakhanger',
  'Orlinsky',
  'Pebblewood',
  'Pennyfold',
  'Quarrington',
  'Ravenhall',
  'Rookwood',
  'Saltmarsh',
  'Sandoval-Reyes',
  'Silverlock',
  'Tallowby',
  'Thistlewood',
  'Underbank',
  'Valderrano',
  'Vintner',
  'Wainscott',
  'Westerhall',
  'Wickstead',
  'Windermoor',
  'Yarborne',
  'Yellowly',
  'Zabrowic',
] as const;

export interface DemoName {
  givenName: string;
  familyName: string;
}

/** Gives out names without repeating a whole name before the lists are used up. */
export function nameSource(random: Random): (sex: Sex) => DemoName {
  const families = random.shuffled(familyNames);
  const given = { male: random.shuffled(givenNames.male), female: random.shuffled(givenNames.female) };
  let count = 0;
  return (sex) => {
    const lap = Math.floor(count / families.length);
    const familyName = families[count % families.length] ?? '';
    const givenName = given[sex][(count + lap * 5) % given[sex].length] ?? '';
    count += 1;
    return { givenName, familyName };
  };
}
