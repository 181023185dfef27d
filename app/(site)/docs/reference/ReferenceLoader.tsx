"use client";

import dynamic from "next/dynamic";
import { Loading } from "@/app/_components/mark/Loading";

/** The reference is large and lives in the browser only: it is loaded when its page is. */
const Reference = dynamic(() => import("./Reference"), { ssr: false, loading: () => <Loading label="Loading the reference" /> });

export const ReferenceLoader = ({ canMakeKey }: { canMakeKey: boolean }) => <Reference canMakeKey={canMakeKey} />;
