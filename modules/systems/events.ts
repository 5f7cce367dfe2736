import { defineEvents } from "@/modules/audit/model";

export const systemsEvents = defineEvents({
  siteCreated: ["site.created", 1, "set up a site"],
  areaCreated: ["area.created", 1, "set up an area"],
  areaEdited: ["area.edited", 1, "changed an area"],
  systemCreated: ["system.created", 1, "set up a system"],
  systemEdited: ["system.edited", 1, "changed a system"],
  systemRetired: ["system.retired", 1, "retired a system"],
  pointAdded: ["point.added", 1, "added a point"],
  pointEdited: ["point.edited", 1, "changed a point"],
  equipmentAdded: ["equipment.added", 1, "added equipment"],
  equipmentEdited: ["equipment.edited", 1, "changed equipment"],
  volumeProposed: ["volume.proposed", 1, "proposed a volume"],
  volumeApproved: ["volume.approved", 1, "approved a volume"],
  volumeDeclined: ["volume.declined", 1, "declined a proposed volume"],
  operatingLevelSet: ["operating-level.set", 1, "set a system's water level"],
});
