import { rule } from '../rule.ts';
import { changedOrders } from './changed-order.ts';
import { publishedOrders } from './published-order.ts';
import { statedOrder } from './stated-order.ts';

export const parametersOrderBroken = rule({
  id: 'parameters.order-broken',
  scope: 'parameters',
  from: 'validation',
  means: 'contradicted',
  statement:
    'Values break a stated order, the order between layers and units that they had before they were scaled or shifted, or a published order of their handbook (curve numbers rise with the soil group and with sealing).',
  why: 'A calibration may move values, not turn the catchment upside down: a topsoil that drains slower than the clay below it, or a meadow that sheds more water than a street, fits a curve and no land.',
  source: {
    basis: 'published',
    citation:
      'USDA-NRCS (2004) National Engineering Handbook, Part 630, ch. 9, and TR-55 (1986) Table 2-2; Chow, V. T. (1959) Open-Channel Hydraulics, Table 5-6; Rawls, W. J. et al. (1982) Trans. ASAE 25(5):1316-1320; stated orders follow from the words',
  },
  clear:
    'Calibrate again with one factor for all layers and units, or with bounds that keep the order; or correct the value that was mistyped.',
  check: ({ fragment: { orders = [] } }, { parameters: { values } }) => [
    ...orders.flatMap((order, index) => statedOrder(order, index, values)),
    ...changedOrders(values, new Set(orders.flatMap(({ of, rising }) => (rising ? [] : (of ?? []))))),
    ...publishedOrders(values),
  ],
});
