import { useQuery } from '@tanstack/react-query';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Loaded } from '../../../components/states.tsx';
import { onlineSettingsQuery } from '../api/online-settings.queries.ts';
import { OnlineSettingsForm } from '../components/online-settings-form.tsx';

export function OnlineSettingsPage() {
  const query = useQuery(onlineSettingsQuery);
  return (
    <>
      <PageHead title="Online booking" above="What customers book by themselves" />
      <RailPage>
        <Loaded query={query} what="online booking">
          {({ settings, services }) => (
            <OnlineSettingsForm key={settings.version} settings={settings} services={services} />
          )}
        </Loaded>
      </RailPage>
    </>
  );
}
