import { useState } from 'react';
import { useAbility } from '@casl/react';
import { useQuery } from '@tanstack/react-query';
import type { AppAbility } from '@driprail/shared/authz/ability';
import { equipmentNames, sizeClassNames, sizeClasses, skillNames } from '@driprail/shared/contracts/fields';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { serviceKinds } from '@driprail/shared/contracts/services.contract';
import { conditionNames } from '@driprail/shared/domain/job-work/judge-change';
import { surchargedConditions } from '@driprail/shared/domain/menu/condition-surcharge';
import { weatherWords } from '@driprail/shared/domain/menu/service-needs';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Sheet } from '../../../components/sheet.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { serverNow } from '../../../lib/device-clock.ts';
import { money } from '../../../lib/format.ts';
import { useSession } from '../../../lib/session.tsx';
import { servicesQuery } from '../api/services.queries.ts';
import { ChecklistSheet } from '../components/checklist-sheet.tsx';
import { ServiceForm, kindNames } from '../components/service-form.tsx';
import { SurchargeForm } from '../components/surcharge-form.tsx';

/** What is sold: price and minutes by size class. */
export function ServiceMenuPage() {
  const { zone, units } = useSession().company;
  const today = dayOf(serverNow().toISOString(), zone);
  const [isSurcharging, setSurcharging] = useState(false);
  const ability = useAbility<AppAbility>();
  const canEdit = ability.can('update', 'Service');
  const [editing, setEditing] = useState<ServiceDto | 'new' | null>(null);
  const [listOf, setListOf] = useState<ServiceDto | null>(null);
  const menu = useQuery(servicesQuery);
  const close = () => setEditing(null);
  return (
    <>
      <PageHead
        title="Service menu"
        above="Price and minutes by size class"
        sums={[{ label: 'On the menu', value: menu.data?.services.filter((s) => s.isActive).length ?? '–' }]}
        actions={
          canEdit ? (
            <Button look="main" onClick={() => setEditing('new')}>
              <Icon name="plus" /> New service
            </Button>
          ) : null
        }
      />
      <RailPage>
        <div className="hung p-5">
          <div className="scroll-x" role="region" aria-label="Prices" tabIndex={0}>
            <Loaded query={menu} what="the service menu">
              {({ services }) =>
                services.length === 0 ? (
                  <Empty>Nothing on the menu yet. Add what you sell, then book the first job.</Empty>
                ) : (
                  <table className="grid-t min-w-[820px]">
                    <thead>
                      <tr>
                        <th>Service</th>
                        {sizeClasses.map((size) => (
                          <th key={size} className="r">
                            {sizeClassNames[size]}
                          </th>
                        ))}
                        <th className="!pl-6">Needs</th>
                        <th className="r">{canEdit ? 'Change' : 'Steps'}</th>
                      </tr>
                    </thead>
                    {serviceKinds.map((kind) => (
                      <tbody key={kind}>
                        {services
                          .filter((service) => service.kind === kind)
                          .map((service, index) => (
                            <tr key={service.id} className={service.isActive ? '' : 't-3'}>
                              <td>
                                {index === 0 ? <span className="block t-tight t-2 pt-2">{kindNames[kind]}</span> : null}
                                <b>{service.name}</b>
                                {service.isActive ? '' : ' (off the menu)'}
                                {service.description ? (
                                  <span className="block t-2 max-w-[38ch]">{service.description}</span>
                                ) : null}
                              </td>
                              {sizeClasses.map((size) => {
                                const price = service.prices.find((p) => p.sizeClass === size);
                                return (
                                  <td key={size} className="r">
                                    {price ? (
                                      <>
                                        <span className="t-fig">{money(price.priceCents)}</span>
                                        <span className="block t-2">{formatMinutes(price.minutes)}</span>
                                      </>
                                    ) : (
                                      '–'
                                    )}
                                  </td>
                                );
                              })}
                              <td className="!pl-6">
                                {needWords(service).join(', ') || '–'}
                                <span className="block t-2">{factWords(service, units).join('. ')}</span>
                              </td>
                              <td className="r whitespace-nowrap">
                                <Button
                                  look="bare"
                                  aria-label={`Steps of ${service.name}`}
                                  onClick={() => setListOf(service)}
                                >
                                  <Icon name="check" /> Steps
                                </Button>
                                {canEdit ? (
                                  <Button look="bare" onClick={() => setEditing(service)}>
                                    <Icon name="pen" /> Edit
                                  </Button>
                                ) : null}
                              </td>
                            </tr>
                          ))}
                      </tbody>
                    ))}
                  </table>
                )
              }
            </Loaded>
          </div>
          {menu.data ? (
            <section className="mt-6 max-w-[560px]" aria-label="Surcharges by condition">
              <h2 className="sec">
                When the car is dirtier than booked
                {canEdit ? (
                  <Button look="bare" onClick={() => setSurcharging(true)}>
                    <Icon name="pen" /> Change
                  </Button>
                ) : null}
              </h2>
              {surchargedConditions.map((condition) => (
                <p key={condition} className="flex justify-between gap-4 py-1">
                  <b>{conditionNames[condition]}</b>
                  <span>
                    {menu.data.surcharges[condition].pricePercent} percent on the price,{' '}
                    {menu.data.surcharges[condition].minutesPercent} percent on the minutes
                  </span>
                </p>
              ))}
            </section>
          ) : null}
        </div>
      </RailPage>
      {isSurcharging && menu.data ? (
        <Sheet title="Surcharge by condition" onClose={() => setSurcharging(false)} width={560}>
          <SurchargeForm surcharges={menu.data.surcharges} today={today} onDone={() => setSurcharging(false)} />
        </Sheet>
      ) : null}
      {listOf ? <ChecklistSheet service={listOf} canEdit={canEdit} onClose={() => setListOf(null)} /> : null}
      {editing ? (
        <Sheet title={editing === 'new' ? 'New service' : editing.name} onClose={close} width={680}>
          <ServiceForm
            service={editing === 'new' ? null : editing}
            services={menu.data?.services ?? []}
            today={today}
            onDone={close}
          />
        </Sheet>
      ) : null}
    </>
  );
}

/** What the crew, the van and the place have to bring. */
function needWords({ skills, equipment, needs }: ServiceDto): string[] {
  return [
    ...skills.map((skill) => skillNames[skill]),
    ...equipment.map((tool) => equipmentNames[tool]),
    ...(needs.water ? ['Water'] : []),
    ...(needs.power ? ['Power'] : []),
  ];
}

/** What it asks of the weather, and what comes after it. */
function factWords({ needs, cureHours, intervalDays, depositPercent }: ServiceDto, units: 'us' | 'metric'): string[] {
  return [
    weatherWords(needs, units),
    cureHours > 0 ? `${cureHours} h to cure` : '',
    intervalDays ? `Due again after ${intervalDays} days` : '',
    depositPercent > 0 ? `${depositPercent} percent deposit` : '',
  ].filter(Boolean);
}
