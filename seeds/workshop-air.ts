import { dateOfDay, dayNumber } from '#shared/domain/calendar';
import { normal, type Random } from './random-draws';
import type { RegionNature } from './regions';

/** Temperature and humidity of a heated workshop on a day: about 16 °C over the year, 20 in July, 12 in January. */
export function drawWorkshopAir(
  random: Random,
  day: number,
  region: RegionNature,
): { temperatureC: number; humidityPct: number } {
  const date = dateOfDay(day);
  const dayOfYear = day - dayNumber(`${date.slice(0, 4)}-01-01`);
  // Coldest about 20 January.
  const season = -Math.cos((2 * Math.PI * (dayOfYear - 20)) / 365.25);
  const temperature = normal(random, 16 + region.workshopOffset + 4 * season, 1.7);
  const humidity = normal(random, region.climate.humidityPct - 14 - 4 * season, 5);
  return {
    temperatureC: Math.round(temperature * 2) / 2,
    humidityPct: Math.round(Math.max(25, Math.min(92, humidity))),
  };
}
