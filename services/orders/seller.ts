/** Who sells: what every invoice says at its head. An installation of another maker changes it here. */
export const seller = {
  name: 'Coilyard',
  lines: ['The Old Ropery', '4 Winders Row', 'Pellstow PL3 4RT'],
  country: 'GB',
  taxId: 'GB 000 0041 27',
};
