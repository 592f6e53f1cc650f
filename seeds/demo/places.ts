import type { SiteKind } from '#shared/catalogues/codes'
import type { BranchKey } from './people'

export interface TownPlan { town: string, county: string, zip: string, lat: number, lon: number }
interface BranchPlaces {
  towns: [TownPlan, ...TownPlan[]]
  streets: [string, ...string[]]
  houses: number
  named: [name: string, site: SiteKind][]
  complex: { name: string, street: string, owner: string, manager: string }
  farm: { name: string, fields: [name: string, site: SiteKind, blocks: string[]][] } | null
}

/** Counties are geography; towns, streets and names are invented, and the readings only lie in the county's neighbourhood. */
export const PLACES: Record<BranchKey, BranchPlaces> = {
  NY: {
    towns: [{ town: 'Ellory', county: 'Albany', zip: '12205', lat: 42.71, lon: -73.83 }, { town: 'Hudson Bluff', county: 'Rensselaer', zip: '12144', lat: 42.64, lon: -73.70 }, { town: 'Cole Falls', county: 'Saratoga', zip: '12866', lat: 43.04, lon: -73.80 }, { town: 'Dorp Hill', county: 'Schenectady', zip: '12306', lat: 42.79, lon: -73.97 }],
    streets: ['Quarry Lane', 'Tannery Row', 'Larkspur Court', 'Old Ferry Road', 'Miller Hollow Road', 'Sexton Street'], houses: 22,
    named: [['Copper Ladle Kitchen', 'restaurant'], ['Bluff Road Diner', 'restaurant'], ['Ellory Mill Offices', 'office'], ['Kestrel School', 'school'], ['North Dock Warehouse', 'warehouse'], ['Penny Lamp Hardware', 'shop'], ['Falls View Inn', 'hotel'], ['Larkspur Green', 'lawn'], ['Dorp Hill Ball Field', 'sports-turf'], ['Tannery Common', 'lawn'], ['Sexton Street Lawns', 'lawn']],
    complex: { name: 'Harbor Hill Homes', street: '200 Harbor Hill', owner: 'Harbor Hill Holdings', manager: 'Harbor Hill Homes office' }, farm: null,
  },
  CA: {
    towns: [{ town: 'Marrow Bend', county: 'Sacramento', zip: '95814', lat: 38.56, lon: -121.47 }, { town: 'Tule Crossing', county: 'Yolo', zip: '95695', lat: 38.67, lon: -121.78 }, { town: 'Granite Ford', county: 'Placer', zip: '95603', lat: 38.90, lon: -121.07 }],
    streets: ['Levee Street', 'Almond Grove Way', 'Heron Court', 'Blue Oak Drive', 'Cannery Avenue'], houses: 19,
    named: [['The Salt Plum', 'restaurant'], ['Heron Street Taqueria', 'restaurant'], ['Levee Court Offices', 'office'], ['Blue Oak School', 'school'], ['Cannery Storage', 'warehouse'], ['Tule Market', 'shop'], ['Granite Ford Lodge', 'hotel'], ['Heron Park Lawn', 'lawn'], ['Granite Ford Soccer Field', 'sports-turf'], ['Blue Oak Commons', 'lawn']],
    complex: { name: 'Cannery Flats', street: '51 Cannery Avenue', owner: 'Cannery Flats Partners', manager: 'Levee Property Care' },
    farm: { name: 'Willow Slough Ranch', fields: [['North almonds', 'orchard', ['Block 1', 'Block 2']], ['Slough field', 'field-crop', ['Block A']]] },
  },
  TX: {
    towns: [{ town: 'Pale Creek', county: 'Travis', zip: '78701', lat: 30.29, lon: -97.74 }, { town: 'Round Bluff', county: 'Williamson', zip: '78664', lat: 30.52, lon: -97.67 }, { town: 'Cypress Bend', county: 'Hays', zip: '78640', lat: 30.02, lon: -97.88 }, { town: 'Lost Pine', county: 'Bastrop', zip: '78602', lat: 30.11, lon: -97.32 }],
    streets: ['Cedar Cut Road', 'Mesquite Run', 'Limestone Lane', 'Old Gin Road', 'Pecan Turn'], houses: 18,
    named: [['Smoke & Juniper', 'restaurant'], ['Old Gin Café', 'restaurant'], ['Limestone Offices', 'office'], ['Pecan Turn School', 'school'], ['Round Bluff Depot', 'warehouse'], ['Creek Feed & Seed', 'shop'], ['Mesquite Court Hotel', 'hotel'], ['Pecan Turn Lawns', 'lawn'], ['Round Bluff Ball Park', 'sports-turf'], ['Lost Pine Green', 'lawn']],
    complex: { name: 'Limestone Terrace', street: '9 Limestone Lane', owner: 'Terrace Living', manager: 'Terrace Living office' },
    farm: { name: 'Three Oaks Farm', fields: [['Creek field', 'field-crop', ['Block 1']], ['Pecan rows', 'orchard', ['Block 2']]] },
  },
}

export const REMARKS = ['Two dogs: ring first', 'Fish pond behind the house', 'Gate code is with the office', 'Beehives along the back fence', 'Ask for the manager', 'Vegetable garden on the south side', 'Cat stays indoors', 'Well head by the garage']
export const GIVEN_NAMES = ['Ada', 'Bram', 'Celia', 'Dov', 'Elena', 'Faisal', 'Greta', 'Hugo', 'Imani', 'Joaquín', 'Kira', 'Lev', 'Mina', 'Nils', 'Odette', 'Pilar', 'Quinn', 'Rosa', 'Sven', 'Talia', 'Umar', 'Vera']
export const FAMILY_NAMES = ['Abernethy', 'Bracken', 'Castellane', 'Dunmore', 'Escobedo', 'Fairweather', 'Grumman', 'Hollis', 'Iwasaki', 'Juster', 'Kowal', 'Lindqvist', 'Márquez', 'Noland', 'Oyelaran', 'Pettibone', 'Quesada', 'Rusk']

/** The county in which nothing was done for one month. */
export const IDLE_COUNTY = 'Bastrop'
