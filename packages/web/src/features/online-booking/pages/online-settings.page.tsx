import { useQuery } from '@tanstack/react-query';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Loaded } from '../../../components/states.tsx';
import { onlineSettingsQuery, useSaveOnlineSettings } from '../api/online-settings.queries.ts';
import { OnlineSettingsForm } from '../components/online-settings-form.tsx';

export function OnlineSettingsPage() {
  const query = useQuery(onlineSettingsQuery);
  // Here, so that what it says outlives the form, which begins anew with what was saved.
  const save = useSaveOnlineSettings();
  return (
    <>
      <PageHead title="Online booking" above="What customers book by themselves" />
      <RailPage>
        <Loaded query={query} what="online booking">
          {({ settings, services }) => (
            <OnlineSettingsForm key={settings.version} settings={settings} services={services} save={save} />
          )}
        </Loaded>
      </RailPage>
    </>
  );
}
