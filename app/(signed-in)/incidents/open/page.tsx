import type { Metadata } from "next";
import { askPage, mustMay } from "@/app/_server/session";
import { PageHead, Panel } from "@/lib/ui";
import { mayInArea } from "@/modules/access";
import { qualityMay } from "@/modules/quality";
import { IncidentByHand } from "@/modules/quality/ui/incident-by-hand";
import { listSystems } from "@/modules/systems";

export const metadata: Metadata = { title: "Open an incident" };

export default async function OpenIncidentPage() {
  const actor = await mustMay(qualityMay.handle);
  const systems = await askPage(listSystems, {});
  return (
    <>
      <PageHead
        title="Open an incident"
        facts="For a trouble that no single reading shows. A reading that is off is taken up where it stands."
      />
      <Panel>
        <IncidentByHand
          systems={systems
            .filter((system) => mayInArea(actor, qualityMay.handle, system.areaId))
            .map(({ id, code, name }) => ({ id, code, name }))}
        />
      </Panel>
    </>
  );
}
