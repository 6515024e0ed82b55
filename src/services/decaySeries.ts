import type { CampaignRow } from '../db/repositories/campaigns';
import type { ScreenRow, WellWithNames } from '../db/repositories/screens';
import type { DecaySeries } from '../kinetics/types';
import { unpackFloats } from './readingsCodec';

/** A screen's wells as the engine takes them; the series' id is the well's. */
export function decaySeriesOfScreen(
  campaign: Pick<CampaignRow, 'nu'>,
  screen: Pick<ScreenRow, 'dimension' | 'kind'>,
  wells: WellWithNames[],
): DecaySeries[] {
  return wells.map(({ well, plateName, catalystCode, siteDensityMolPerKg }) => ({
    id: well.id,
    catalyst: catalystCode,
    role: well.role,
    // A plate at one set temperature shares its temperature error.
    block: `${plateName} / ${well.temperatureK.toFixed(2)} K`,
    temperatureK: well.measuredTemperatureK ?? well.temperatureK,
    timesS: unpackFloats(well.timesS).map((time) => time ?? 0),
    values: unpackFloats(well.readings),
    dimension: screen.dimension,
    kind: screen.kind,
    initialConcentration: null,
    productPerReactant: 1,
    loadingGPerL:
      well.massG !== null && well.volumeL !== null && well.volumeL > 0
        ? well.massG / well.volumeL
        : null,
    siteDensityMolPerKg,
    nu: campaign.nu,
    law: 'auto',
  }));
}
