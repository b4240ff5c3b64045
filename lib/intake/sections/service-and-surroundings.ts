import type { SectionDefinition } from "../field-types";

export const SERVICE_AND_SURROUNDINGS = {
  key: "service",
  title: "Service conditions",
  note: "How it was loaded, kept and looked after",
  groups: [
    {
      title: "Service",
      fields: [
        {
          key: "cyclesInService",
          kind: "number",
          need: "must",
          label: "Load cycles",
          unit: "cycles",
          least: 0,
          columns: 3,
        },
        {
          key: "startsInService",
          kind: "number",
          need: "must",
          label: "Starts",
          unit: "starts",
          least: 0,
          columns: 3,
        },
        {
          key: "distanceKm",
          kind: "number",
          need: "must",
          label: "Distance run",
          unit: "km",
          least: 0,
          columns: 3,
        },
        {
          key: "throughputT",
          kind: "number",
          need: "must",
          label: "Mass moved",
          unit: "t",
          least: 0,
          columns: 3,
        },
      ],
    },
    {
      title: "Loads",
      fields: [
        { key: "nominalLoad", kind: "text", need: "should", label: "Nominal load", columns: 6 },
        { key: "peakLoad", kind: "text", need: "should", label: "Peak load", columns: 6 },
        {
          key: "loadEvents",
          kind: "longText",
          need: "should",
          label: "Overloads, impacts, tightening torque",
          columns: 6,
        },
        { key: "vibration", kind: "longText", need: "should", label: "Vibration", columns: 6 },
      ],
    },
    {
      title: "Surroundings",
      fields: [
        {
          key: "temperatureC",
          kind: "range",
          need: "should",
          label: "Temperature in service",
          unit: "°C",
          least: -273.15,
          columns: 4,
        },
        { key: "humidity", kind: "text", need: "should", label: "Humidity, wetting", columns: 4 },
        {
          key: "fluids",
          kind: "text",
          need: "should",
          label: "Fluids it met",
          columns: 4,
        },
        { key: "chlorides", kind: "text", need: "should", label: "Chlorides, salt", columns: 4 },
        {
          key: "hydrogenSulfide",
          kind: "text",
          need: "should",
          label: "Hydrogen sulfide",
          columns: 4,
        },
        {
          key: "cathodicProtection",
          kind: "text",
          need: "should",
          label: "Cathodic protection",
          columns: 4,
        },
      ],
    },
    {
      title: "Maintenance",
      fields: [
        {
          key: "lastInspection",
          kind: "text",
          need: "should",
          label: "Last inspection and method",
          columns: 6,
        },
        {
          key: "repairs",
          kind: "text",
          need: "should",
          label: "Repairs and parts changed",
          columns: 6,
        },
        { key: "lubrication", kind: "text", need: "should", label: "Lubrication", columns: 6 },
        {
          key: "cleaningAgents",
          kind: "text",
          need: "should",
          label: "Cleaning agents in service",
          columns: 6,
        },
      ],
    },
  ],
} as const satisfies SectionDefinition;
