import { corrosivityWords } from './corrosivity-words';
import { climateTyped, wrongInClimate } from './region-changes';

const COAST = {
  temperatureC: '9.5',
  humidityPct: '81',
  so2Deposition: '4',
  chlorideDeposition: '60',
};

describe('climateTyped', () => {
  it('four means typed, is the climate', () => {
    expect(climateTyped(COAST)).toEqual({
      temperatureC: 9.5,
      humidityPct: 81,
      so2Deposition: 4,
      chlorideDeposition: 60,
    });
  });

  it('one of four missing, is none, and the missing one is told rather than dropped', () => {
    const typed = { ...COAST, so2Deposition: '' };
    expect(climateTyped(typed)).toBeUndefined();
    expect(Object.keys(wrongInClimate(typed))).toEqual(['so2Deposition']);
  });

  it('all four empty, is none and nothing is wrong', () => {
    const typed = { temperatureC: '', humidityPct: '', so2Deposition: '', chlorideDeposition: '' };
    expect(climateTyped(typed)).toBeUndefined();
    expect(wrongInClimate(typed)).toEqual({});
  });

  it('more than all the water air can hold, is told between what it can lie', () => {
    expect(wrongInClimate({ ...COAST, humidityPct: '104' })).toEqual({
      humidityPct: 'Between 0 and 100.',
    });
  });
});

describe('corrosivityWords', () => {
  it('air within the fitted range, is a rate and a category without a caveat', () => {
    const climate = {
      temperatureC: 9.5,
      humidityPct: 81,
      so2Deposition: 4,
      chlorideDeposition: 60,
    };
    // ISO 9223:2012, equation (1): 1.77·4^0.52·e^(0.02·81 − 0.15·0.5) + 0.102·60^0.62·e^(0.033·81 + 0.04·9.5) = 44.0.
    expect(corrosivityWords(climate)).toEqual({
      rate: '44\u202fµm a year',
      category: 'C3, medium',
      caveat: undefined,
    });
  });

  it('air cleaner than any the formula was fitted on, says that it lies outside', () => {
    const climate = { temperatureC: 2, humidityPct: 70, so2Deposition: 0, chlorideDeposition: 0 };
    expect(corrosivityWords(climate).caveat).toMatch(/^Outside the fitted range/);
  });

  it('beyond all categories, names none', () => {
    const climate = {
      temperatureC: 50,
      humidityPct: 93,
      so2Deposition: 150,
      chlorideDeposition: 760,
    };
    expect(corrosivityWords(climate).category).toBe('above CX: the standard names no category');
  });
});
