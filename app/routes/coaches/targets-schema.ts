import { z } from 'zod';
import { type Axle, type AxleLayout, axleName, axlesOf } from '~/loads';
import type { PressureUnit } from '~/units';
import { limitField } from './form/typed-fields';

/** A target for each axle of the layout. */
export const targetsSchema = (layout: AxleLayout, unit: PressureUnit) =>
  z.object(
    Object.fromEntries(
      axlesOf(layout).map((axle) => [
        axle,
        limitField(unit, `the ${axleName(axle).toLowerCase()} axle’s cold pressure`),
      ]),
    ) as Record<Axle, ReturnType<typeof limitField>>,
  );
