import { placesOf } from '../place-maker'

export const PLACES = placesOf('s', [
  {
    key: 'shop',
    name: 'Shop',
    holds: { window: 'window', counter: 'counter', 'shop-wall': 'back wall' },
  },
  {
    key: 'workshop',
    name: 'Workshop',
    holds: {
      bench: { name: 'bench', holds: { 'bench-left': 'left end', 'bench-right': 'right end' } },
      rack: {
        name: 'rack',
        holds: { 'rack-1': 'shelf 1', 'rack-2': 'shelf 2', 'rack-3': 'shelf 3' },
      },
      drawer: 'leads drawer',
    },
  },
  {
    key: 'store',
    name: 'Store',
    holds: { 'store-sets': 'sets', 'store-boxes': 'boxes', 'store-parts': 'for parts' },
  },
  { key: 'roof', name: 'Roof' },
  { key: 'away', name: 'Lent out' },
])
