import { placesOf } from '../place-maker'

export const PLACES = placesOf('a', [
  {
    key: 'front-room',
    name: 'Front room',
    holds: { 'front-shelf-1': 'shelf 1', 'front-shelf-2': 'shelf 2', 'front-shelf-3': 'shelf 3' },
  },
  {
    key: 'loft',
    name: 'Loft',
    holds: { 'loft-1': 'crate 1', 'loft-3': 'crate 3', 'loft-5': 'crate 5' },
  },
  { key: 'garage', name: 'Garage', holds: { 'garage-a': 'rack A', 'garage-b': 'rack B' } },
  { key: 'bedroom', name: 'Back bedroom', holds: { 'under-desk': 'under desk' } },
  { key: 'desk', name: 'Desk', holds: { 'desk-2': 'second drawer' } },
  { key: 'hall', name: 'Hall', holds: { drawer: 'leads drawer' } },
  { key: 'bench', name: 'On the bench' },
  { key: 'roof', name: 'Roof' },
])
