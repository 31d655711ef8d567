import type { HistoryMould, HistoryPerson, HistorySupplier } from './types.ts';

export const quernbyPeople: HistoryPerson[] = [
  { key: 'ilse', name: 'Ilse Quarrendon', email: 'ilse@quernbyloft.example', role: 'owner' },
  { key: 'tomasz', name: 'Tomasz Weller-Adeyi', email: 'tomasz@quernbyloft.example', role: 'maker' },
  { key: 'priya', name: 'Priya Hartnoll', email: 'priya@quernbyloft.example', role: 'maker' },
  { key: 'benedikt', name: 'Benedikt Osei-Marsh', email: 'benedikt@quernbyloft.example', role: 'inspector' },
  { key: 'noor', name: 'Noor Lindqvist-Bray', email: 'noor@quernbyloft.example', role: 'inspector' },
  { key: 'clement', name: 'Clement Arbour-Reyes', email: 'clement@quernbyloft.example', role: 'viewer' },
];

export const quernbySuppliers: HistorySupplier[] = [
  { key: 'aldersyke', name: 'Aldersyke Scentworks', contactName: 'Rhona Pellow', email: 'rhona@aldersyke.example', note: 'Answers within two days. Sends certificates by mail only.' },
  { key: 'corvane', name: 'Corvane Aromas', contactName: 'Idris Mallory-Finch', email: 'idris@corvane.example', note: 'Vanillin is always on the paper.' },
  { key: 'hexley', name: 'Hexley & Thorn Oils', contactName: 'Bettrys Thorn', email: 'orders@hexleythorn.example', note: 'Drums of 25 kg, jars of butter 5 kg.' },
  { key: 'paleharbour', name: 'Pale Harbour Alkalis', contactName: 'Sefton Grue', email: 'office@paleharbour.example' },
  { key: 'dunmarrow', name: 'Dunmarrow Colours', contactName: 'Ione Castleby', email: 'ione@dunmarrow.example' },
  { key: 'tarrabin', name: 'Tarrabin Packaging', contactName: 'Wyn Oakhanger', email: 'sales@tarrabin.example' },
];

export const quernbyMoulds: HistoryMould[] = [
  { key: 'M1', name: 'M1 wood', oilMassG: 1000, bars: 12 },
  { key: 'M2', name: 'M2 silicone', oilMassG: 1000, bars: 12 },
  { key: 'M3', name: 'M3 tall', oilMassG: 850, bars: 10 },
  { key: 'M4', name: 'M4 slab', oilMassG: 2000, bars: 24 },
];
