"use client";
import { useState } from "react";
import { Button, DataTable, EmptyState, Notice, PageHead, useDone } from "@/lib/ui";
import type { AreaRow, SiteRow } from "../model";
import { AreaForm, SiteForm } from "./area-form";

type Open = { kind: "site" } | { kind: "area"; area: AreaRow | null } | null;

/** Setup: the galleries and buildings, in the order in which they are walked. */
export function AreasSetup({
  sites,
  areas,
  mayManage,
}: {
  sites: SiteRow[];
  areas: AreaRow[];
  mayManage: boolean;
}) {
  const [open, setOpen] = useState<Open>(null);
  const done = useDone();
  const close = () => setOpen(null);
  const finish = (text: string) => {
    close();
    done(text);
  };
  const add = (
    <Button variant="next" onClick={() => setOpen({ kind: "area", area: null })}>
      Add an area
    </Button>
  );
  const canAdd = mayManage && sites.length > 0;
  return (
    <>
      <PageHead
        title="Areas"
        facts={`${areas.length === 1 ? "1 area" : `${areas.length} areas`}${sites.length === 1 ? ` at ${sites[0]?.name}` : ""}`}
        actions={canAdd && areas.length > 0 ? add : undefined}
      />
      {sites.length === 0 ? (
        <Notice
          title="The site comes first"
          actions={
            mayManage && (
              <Button variant="next" onClick={() => setOpen({ kind: "site" })}>
                Set up the site
              </Button>
            )
          }
        >
          Every area belongs to a site: the place with its own address.{" "}
          {mayManage ? "" : "An administrator sets it up."}
        </Notice>
      ) : (
        <DataTable
          caption="Areas in walking order"
          rows={areas}
          rowKey={(area) => area.id}
          empty={
            <EmptyState title="No areas yet" actions={canAdd ? add : undefined}>
              An area is a gallery or building with a biosecurity level. Systems stand in areas, and a round
              walks one area after another. {mayManage ? "" : "An administrator sets them up."}
            </EmptyState>
          }
          columns={[
            { id: "order", head: "Order", numeric: true, cell: (area) => area.walkingOrder },
            { id: "code", head: "Code", rowHead: true, tight: true, cell: (area) => area.code },
            { id: "name", head: "Name", cell: (area) => area.name },
            { id: "level", head: "Biosecurity level", numeric: true, cell: (area) => area.biosecurityLevel },
            { id: "systems", head: "Systems", numeric: true, cell: (area) => area.systemCount },
            ...(mayManage
              ? [
                  {
                    id: "edit",
                    head: <span className="sr-only">Act</span>,
                    cell: (area: AreaRow) => (
                      <Button
                        size="small"
                        aria-label={`Edit area ${area.code}`}
                        onClick={() => setOpen({ kind: "area", area })}
                      >
                        Edit
                      </Button>
                    ),
                  },
                ]
              : []),
          ]}
        />
      )}
      {open?.kind === "site" && <SiteForm onClose={close} onDone={finish} />}
      {open?.kind === "area" && <AreaForm area={open.area} onClose={close} onDone={finish} />}
    </>
  );
}
