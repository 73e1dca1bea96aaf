/** The people of the demonstration, by what they are called in these tests. */
export const PEOPLE = {
  apprentice: 'apprentice@northgate.example',
  technician: 'technician@northgate.example',
  northSenior: 'senior@northgate.example',
  northOwner: 'owner@northgate.example',
  senior: 'senior@pierstreet.example',
  pierEditor: 'editor@pierstreet.example',
  pierOwner: 'owner@pierstreet.example',
  sawmillApprentice: 'apprentice@sawmill.example',
  sawmillEditor: 'editor@sawmill.example',
  sawmillOwner: 'owner@sawmill.example',
  editor: 'editor@halden.example',
  editor2: 'editor2@halden.example',
  steward: 'steward@halden.example',
} as const;
export type Who = keyof typeof PEOPLE;

export const PASSWORD = 'matchmark-demo';
