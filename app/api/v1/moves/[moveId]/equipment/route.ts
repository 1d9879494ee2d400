import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";
import { editEquipment } from "@/lib/moves/commands";
import { editEquipmentInput } from "@/lib/moves/input";
import { getEquipment } from "@/lib/moves/queries";

export const GET = route<{ moveId: string }>((viewer, { moveId }) => getEquipment(viewer, moveId));
export const PUT = command(editEquipmentInput, editEquipment);
