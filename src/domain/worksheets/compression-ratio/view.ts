export const groups = [
  { title: 'Cylinder', fields: ['bore', 'stroke'] },
  { title: 'Above the piston', fields: ['chamber', 'gasketBore', 'gasketThickness', 'crown', 'crownVolume', 'deck'] },
  {
    title: 'Deck clearance by the parts, where it was not measured',
    fields: ['blockHeight', 'rodLength', 'pinHeight'],
  },
  { title: 'Judged by', fields: ['ratio', 'wanted'] },
] as const;

export const example = {
  bore: '82',
  stroke: '85',
  chamber: '42',
  gasketBore: '83',
  gasketThickness: '0.8',
  crown: 'dish',
  crownVolume: '3',
  deck: '0.2',
  wanted: '10.5',
};
