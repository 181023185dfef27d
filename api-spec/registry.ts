import type { OperationDefinition } from "./define";
import { airDensity } from "./calculations/airDensity";
import { airflow } from "./calculations/airflow";
import { batch } from "./calculations/batch";
import { averageVelocity } from "./calculations/averageVelocity";
import { densityCorrection } from "./calculations/densityCorrection";
import { ductArea } from "./calculations/ductArea";
import { fanAdjustment } from "./calculations/fanAdjustment";
import { reconciliation } from "./calculations/reconciliation";
import { systemBalance } from "./calculations/systemBalance";
import { traversePlan } from "./calculations/traversePlan";
import * as attachments from "./records/attachments";
import * as events from "./records/events";
import { exportTraverses } from "./records/exports";
import * as imports from "./records/imports";
import * as instruments from "./records/instruments";
import * as projects from "./records/projects";
import * as traverses from "./records/traverses";
import { readUsage } from "./records/usage";
import { verify } from "./records/verify";
import * as webhooks from "./records/webhookEndpoints";

/** Every operation of the public API, in the order the reference shows them. */
export const OPERATIONS: OperationDefinition[] = [
  ductArea, traversePlan, airDensity, densityCorrection, averageVelocity, airflow, reconciliation, fanAdjustment, systemBalance, batch,
  projects.createProject, projects.listProjects, projects.readProject, projects.changeProject, projects.deleteProject,
  instruments.createInstrument, instruments.listInstruments, instruments.readInstrument, instruments.changeInstrument, instruments.deleteInstrument,
  instruments.createCalibration, instruments.listCalibrations, instruments.readCalibration,
  traverses.createTraverse, traverses.listTraverses, traverses.readTraverse, traverses.changeTraverse, traverses.deleteTraverse,
  traverses.issueTraverse, traverses.voidTraverse, traverses.reviseTraverse, traverses.readHistory, traverses.readSignature, traverses.readFigure, traverses.readCertificate,
  verify,
  webhooks.createWebhookEndpoint, webhooks.listWebhookEndpoints, webhooks.readWebhookEndpoint, webhooks.changeWebhookEndpoint, webhooks.deleteWebhookEndpoint,
  webhooks.rotateWebhookSecret, webhooks.listDeliveries, webhooks.redeliver, events.listEvents, events.readEvent,
  attachments.createAttachment, attachments.listAttachments, attachments.readAttachment, attachments.changeAttachment, attachments.deleteAttachment,
  attachments.readAttachmentContent,
  imports.createImport, imports.listImports, imports.readImport, exportTraverses,
  readUsage,
];

/** Groups of operations, with what the reference says of each. */
export const TAGS: Record<string, string> = {
  Calculations: "Arithmetic of a duct traverse. Nothing is stored; the same request always gives the same answer.",
  Projects: "Jobs that traverses belong to.",
  Instruments: "The firm's instruments and their calibrations.",
  Traverses: "Stored traverses: drafts that can be changed, and issued records that are signed and stay.",
  Attachments: "Photographs and documents of a traverse: part of a draft, and kept with what was issued.",
  "Imports and exports": "Many traverses at once, from a CSV file and to one.",
  Verification: "For anyone who holds a record: no key is needed.",
  "Events and webhooks": "What happened to records, and endpoints that are told of it.",
  Usage: "What the organisation's keys were used for.",
};
