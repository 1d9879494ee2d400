"use client";

import { useFormStatus } from "react-dom";
import { Button, type ButtonProps } from "@/components/ui/button";

/** Sends the form it stands in; says so while that runs and can't be pressed twice. */
export function SubmitButton({ busyWords = "One moment…", ...props }: ButtonProps) {
  const { pending } = useFormStatus();
  return <Button {...props} type="submit" busy={pending} busyWords={busyWords} />;
}
