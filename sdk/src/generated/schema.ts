// generated from openapi/openapi.json by sdk/scripts/generate.ts: do not edit
import type { Column } from "../columns.ts";

export interface paths {
    "/health/live": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /**
         * Is the process alive
         * @description Answers as long as the process can answer at all, while draining too.
         */
        get: operations["liveness"];
        put?: never;
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/health/ready": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /**
         * May requests be sent here
         * @description True once the workers are warm, false as soon as the service is told to stop.
         */
        get: operations["readiness"];
        put?: never;
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/openapi.json": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /**
         * Read this document
         * @description The OpenAPI 3.1 document of this version.
         */
        get: operations["document"];
        put?: never;
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/v1/comparisons": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /**
         * Compare tracking rules and converters
         * @description 2 to 24 candidates on one array over one climate: what each delivers, its difference to the baseline and to the best, and what the difference is worth per year. Worth and payback need energyValue and a climate of 365 or 366 days.
         */
        post: operations["compare"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/v1/curves": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /**
         * Draw the I-V and P-V curve
         * @description The curve of an array in one weather as its converter sees it, every peak, and where each given rule sits at rest with what it loses and why.
         */
        post: operations["curve"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/v1/efficiency-tests": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /**
         * Test a rule's MPPT efficiency by the standard
         * @description The dynamic sequences and the static levels of EN 50530:2010 (from memory; their durations close) for any rule on any module, by cause, and on request the course of one row.
         */
        post: operations["testEfficiency"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/v1/estimates": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /**
         * Estimate what a tracking rule loses
         * @description One module, one array, one rule on a converter, one climate: available, delivered and lost energy, the loss by cause, by month and by irradiance, and what each sample did. Only module, rule and climate are required.
         */
        post: operations["estimate"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/v1/module-fits": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /**
         * Find a module's circuit
         * @description From a datasheet or from measured I-V points to the single-diode circuit, which can be sent back as a module, and how well it fits. A datasheet that no circuit meets gets the nearest one, or is refused with every misfit shown.
         */
        post: operations["fitModule"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/v1/portfolios": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /**
         * Compare candidates at many sites
         * @description Compares candidates at many sites, streamed: one JSON object a line, in and out. A defaults line (the first or none) holds what sites share; climate lines name climates that sites below refer to; each other line is a site. Results come as sites are done, in any order, and the totals last; an answer without a totals line was cut. A line that is wrong gets a line that says why and leaves the others alone; a wrong first line refuses the request, unless it is a site or a climate. Read the answer while you send: lines are taken no faster than results are read. At most 16777216 bytes a line, 100000 sites, 64 named climates of 67108864 bytes together, and 60 s without a byte either way.
         */
        post: operations["portfolio"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/v1/rules": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /**
         * List the tracking rules
         * @description Every tracking rule with its parameters, defaults, ranges, usual ranges and their sources.
         */
        get: operations["rules"];
        put?: never;
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/v1/tunings": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /**
         * Find the setting that loses least
         * @description The best value of one numeric setting of a rule, the loss around it, the range in which it hardly matters, and what the setting of today loses. With several sites: the best common setting, each site's own, and what the common one costs it.
         */
        post: operations["tune"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/version": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /**
         * Name the version and the limits in force
         * @description The service's version and the limits in force: at most this document's ceilings, which the example shows.
         */
        get: operations["version"];
        put?: never;
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
}
export type webhooks = Record<string, never>;
export interface components {
    schemas: {
        /** @description Temperature of the air, and how the cells follow it (`model`: faiman with its defaults when left out). */
        AmbientTemperature: {
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "ambient";
            model?: components["schemas"]["CellTemperatureModel"];
            /**
             * @description Time constant of the modules' heat, followed below a step of 600 s; 0: none. Unit: s.
             * @default 0
             */
            thermalLag?: number;
            /** @description Temperature of the air. Unit: degC. */
            values: Column;
            /** @description Wind speed; left out, 1 m/s is taken and a caution says so. Unit: m/s. */
            windSpeed?: Column;
        };
        /** @description Modules in series and in parallel, and the wiring to the converter. */
        ArrayLayout: {
            /**
             * @description Modules in series in each string. Unit: 1.
             * @default 1
             */
            modulesInSeries?: number;
            /**
             * @description Strings in parallel. Unit: 1.
             * @default 1
             */
            stringsInParallel?: number;
            /**
             * @description Resistance between array and converter, of the whole array. Unit: ohm.
             * @default 0
             */
            wiringResistance?: number;
        };
        /**
         * Battery-coupled
         * @description No tracking: the array works at the battery's voltage plus the drop of the path. A full battery is not modelled.
         */
        BatteryCoupledRule: {
            /** @description Battery voltage at the converter's terminals: one value, or one a sample of the climate. Source: common practice, no source. Unit: V. */
            batteryVoltage: number | Column;
            /**
             * @description Time between two decisions of the rule. Usual: 0.02 to 1. Source: common practice, no source. Unit: s.
             * @default 1
             */
            controlPeriod?: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "battery-coupled";
            /**
             * @description Voltage drop between the array's terminals and the battery (blocking diode, switch, fuse). Usual: 0 to 1. Source: common practice, no source. Unit: V.
             * @default 0
             */
            pathDrop?: number;
            /**
             * @description Step of the array voltage at each decision; 0 holds the target exactly, more makes the voltage hunt. Usual: 0 to 0.02. Source: common practice, no source. Unit: 1, of the open-circuit voltage at standard test conditions.
             * @default 0
             */
            stepFraction?: number;
        };
        /** @description One rule on one converter under a name; without a converter it has that of the request. */
        Candidate: {
            converter?: components["schemas"]["Converter"];
            /**
             * @description Name of the candidate in the answer: 1 to 100 characters, each name once.
             * @example hold a fraction
             */
            label: string;
            /** @description Price of this candidate's converter. Unit: the currency of energyValue. */
            price?: number;
            rule: components["schemas"]["Rule"];
        };
        /** @description Lost energy of each sample by cause. */
        CauseTrace: {
            /** @description The reference is stale: held from the last sample. Unit: kWh. */
            heldSample: (number | null)[];
            /** @description Nothing is delivered while sampling, sweeping or asleep. Unit: kWh. */
            interruption: (number | null)[];
            /** @description Steps, hunting and ripple around the target. Unit: kWh. */
            regulation: (number | null)[];
            /** @description The rule's own target misses the maximum. Unit: kWh. */
            setPoint: (number | null)[];
            /** @description The maximum lies outside the converter's voltage window. Unit: kWh. */
            voltageWindow: (number | null)[];
            /** @description The rule sits on a lower peak of the power curve. Unit: kWh. */
            wrongPeak: (number | null)[];
        };
        /** @description Something to know before acting on the figures. */
        Caution: {
            code: string;
            /** @description What to know before acting on the figures. */
            detail: string;
            /** @description info, warning or danger. */
            severity: string;
            values: {
                [key: string]: number;
            };
        };
        /** @description Cell temperature, measured or computed elsewhere. */
        CellTemperature: {
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "cell";
            /** @description Cell temperature. Unit: degC. */
            values: Column;
        };
        /** @description How the cell temperature follows from irradiance, air and wind. */
        CellTemperatureModel: components["schemas"]["FaimanModel"] | components["schemas"]["NoctModel"] | components["schemas"]["KingModel"];
        /** @description Null for the test generator, whose formula is its own. */
        Circuit: {
            /** @description Band gap of the cells at 25 degC. Unit: eV. */
            bandgap: number;
            /** @description Relative change of the band gap with temperature. Unit: 1/K. */
            bandgapCoefficient: number;
            /** @description Cells in series inside the module. Unit: 1. */
            cellsInSeries: number;
            /** @description n Ns k T/q of the whole module at 25 degC. Unit: V. */
            idealityVoltage: number;
            /** @description Always single-diode: the circuit is a module that can be sent back. */
            kind: string;
            /** @description Photocurrent at standard test conditions. Unit: A. */
            photocurrent: number;
            /** @description Change of the photocurrent with temperature. Unit: %/K. */
            photocurrentCoefficient: number;
            /** @description Saturation current of the diode at 25 degC. Unit: A. */
            saturationCurrent: number;
            /** @description Series resistance of the module. Unit: ohm. */
            seriesResistance: number;
            /** @description Shunt resistance at 1000 W/m2; null: infinite. Unit: ohm. */
            shuntResistance: number | null;
        } | null;
        /** @description Equally spaced samples of irradiance and temperature; columns of equal length. */
        Climate: {
            /**
             * @description What happens to missing samples (null): the request is refused, they are left out of every sum, or gaps up to a length are filled along a straight line.
             * @default refuse
             */
            gaps?: ("refuse" | "skip") | components["schemas"]["InterpolateGaps"];
            irradiance: components["schemas"]["Irradiance"];
            /**
             * @description Start of the first sample, ISO 8601 with offset from UTC; months follow this clock.
             * @example 2025-01-01T00:00:00+01:00
             */
            start: string;
            /** @description Time from one sample to the next. Unit: s. */
            step: number;
            temperature: components["schemas"]["Temperature"];
            /**
             * @description A sample is the mean over its step, or the value at its start.
             * @default mean
             * @enum {string}
             */
            timing?: "mean" | "instant";
        };
        /** @description One candidate's figures beside the baseline's and the best one's. */
        ComparedCandidate: {
            /** @description Delivered more than the baseline. Unit: kWh. */
            differenceToBaseline: number;
            /** @description Delivered against the best candidate: 0 or below. Unit: kWh. */
            differenceToBest: number;
            energy: components["schemas"]["Energy"];
            label: string;
            lostByCause: components["schemas"]["LostByCause"];
            /** @description In which the worth pays the price above the baseline's; null where there is none. Unit: years. */
            payback: number | null;
            /** @description From 1, by delivered energy; equals share a rank. Unit: 1. */
            rank: number;
            /** @description Of the difference to the baseline. Unit: the currency of energyValue. */
            worthPerYear: number | null;
            /** @description Why no worth per year can be said; null when it can. */
            worthReason: string | null;
        };
        /** @description What each candidate delivers, and what the difference is worth. */
        ComparisonAnswer: {
            cautions: components["schemas"]["Caution"][];
            coverage: components["schemas"]["Coverage"];
            module: components["schemas"]["ModuleAnswer"];
            provenance: components["schemas"]["Provenance"];
            resolved: components["schemas"]["ResolvedComparison"];
            /** @description In the order of the request. */
            results: components["schemas"]["ComparedCandidate"][];
        };
        /** @description Several rules and converters on one array over one climate. */
        ComparisonRequest: {
            array?: components["schemas"]["ArrayLayout"];
            /**
             * @description Label of the candidate the others are compared with; left out: the first.
             * @example hold a fraction
             */
            baseline?: string;
            /** @description 2 to 24 rules on converters; `converter` above holds for those without their own. */
            candidates: components["schemas"]["Candidate"][];
            climate: components["schemas"]["Climate"];
            converter?: components["schemas"]["Converter"];
            energyValue?: components["schemas"]["EnergyValue"];
            /**
             * @description steady: each sample at rest. stepped: every rule at its own control period. auto: stepped up to a step of 300 s, steady above; the answer says which and why.
             * @default auto
             * @enum {string}
             */
            mode?: "auto" | "steady" | "stepped";
            module: components["schemas"]["Module"];
            /**
             * @description Coldest temperature on record at the site, for the caution; null: not known. Unit: degC.
             * @default null
             */
            recordLowTemperature?: number | null;
        };
        /**
         * Constant voltage
         * @description Holds one voltage per module, set once, in all weather.
         */
        ConstantVoltageRule: {
            /**
             * @description Time between two decisions of the rule. Usual: 0.02 to 1. Source: common practice, no source. Unit: s.
             * @default 1
             */
            controlPeriod?: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "constant-voltage";
            /** @description Voltage held, per module in series. Default: maximum power voltage of the module at standard test conditions. Source: common practice, no source. Unit: V. */
            setVoltagePerModule?: number;
            /**
             * @description Step of the array voltage at each decision; 0 holds the target exactly, more makes the voltage hunt. Usual: 0 to 0.02. Source: common practice, no source. Unit: 1, of the open-circuit voltage at standard test conditions.
             * @default 0
             */
            stepFraction?: number;
        };
        /** @description What limits the rule: voltage window, limits, ripple and sensors. */
        Converter: {
            /**
             * @description Highest voltage the input bears, for the caution only; null: not known. Unit: V.
             * @default null
             */
            inputVoltageRating?: number | null;
            /**
             * @description Most the input takes; null: no limit. Unit: A.
             * @default null
             */
            maximumCurrent?: number | null;
            /**
             * @description Most the input takes; null: no limit. Unit: W.
             * @default null
             */
            maximumPower?: number | null;
            resolution?: components["schemas"]["SensorResolution"];
            /**
             * @description Amplitude of the voltage ripple. Unit: 1, of the voltage.
             * @default 0
             */
            rippleAmplitude?: number;
            sensorError?: components["schemas"]["SensorError"];
            /**
             * @description Upper end of the voltage window; null: none. Unit: V.
             * @default null
             */
            trackingMaximumVoltage?: number | null;
            /**
             * @description Lower end of the voltage window. Unit: V.
             * @default 0
             */
            trackingMinimumVoltage?: number;
            /**
             * @description Asleep while the array could give less. Unit: W.
             * @default 0
             */
            wakePower?: number;
        };
        /** @description How many samples counted. */
        Coverage: {
            /** @description Samples of the climate. Unit: 1. */
            samples: number;
            /** @description Missing samples, left out of every sum. Unit: 1. */
            skipped: number;
            /** @description Samples that count. Unit: 1. */
            used: number;
        };
        /** @description The I-V and P-V curve and where each rule sits on it. */
        CurveAnswer: {
            /** @description Current at each voltage. Unit: A. */
            current: (number | null)[];
            module: components["schemas"]["ModuleAnswer"];
            /** @description Voltage at no current. Unit: V. */
            openCircuitVoltage: number;
            /** @description Every peak of the power curve, the highest first. */
            peaks: components["schemas"]["CurvePoint"][];
            /** @description One for each rule, in the order of the request. */
            places: components["schemas"]["RulePlace"][];
            /** @description Power at each voltage. Unit: W. */
            power: (number | null)[];
            provenance: components["schemas"]["Provenance"];
            /** @description Current at 0 V, behind the wiring. Unit: A. */
            shortCircuitCurrent: number;
            /** @description From 0 to open circuit, equally spaced. Unit: V. */
            voltage: (number | null)[];
        };
        /** @description A point of the curve. */
        CurvePoint: {
            /** @description Current. Unit: A. */
            current: number;
            /** @description Power. Unit: W. */
            power: number;
            /** @description Voltage at the converter's terminals. Unit: V. */
            voltage: number;
        };
        /** @description One array in one weather. */
        CurveRequest: {
            array?: components["schemas"]["ArrayLayout"];
            /** @description Cell temperature. Unit: degC. */
            cellTemperature: number;
            converter?: components["schemas"]["Converter"];
            /** @description Irradiance on the plane of the modules. Unit: W/m2. */
            irradiance: number;
            module: components["schemas"]["Module"];
            /**
             * @description Points of the curve. Unit: 1.
             * @default 101
             */
            points?: number;
            /**
             * @description Rules whose place on the curve is wanted, at rest.
             * @default []
             */
            rules?: components["schemas"]["Rule"][];
        };
        /** @description A module as its datasheet prints it, at 1000 W/m2 and 25 degC. */
        DatasheetModule: {
            /**
             * @description Band gap of the cells at 25 degC; silicon by default. Unit: eV.
             * @default 1.121
             */
            bandgap?: number;
            /**
             * @description Relative change of the band gap with temperature; silicon by default. Unit: 1/K.
             * @default -0.0002677
             */
            bandgapCoefficient?: number;
            /** @description Cells in series inside the module. Unit: 1. */
            cellsInSeries: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "datasheet";
            /** @description Current at maximum power, below the short-circuit current. Unit: A. */
            maximumPowerCurrent: number;
            /** @description Voltage at maximum power, below the open-circuit voltage. Unit: V. */
            maximumPowerVoltage: number;
            /** @description Open-circuit voltage at standard test conditions. Unit: V. */
            openCircuitVoltage: number;
            /** @description Change of the open-circuit voltage with temperature. Unit: %/K. */
            openCircuitVoltageCoefficient: number;
            /** @description Short-circuit current at standard test conditions. Unit: A. */
            shortCircuitCurrent: number;
            /** @description Change of the short-circuit current with temperature. Unit: %/K. */
            shortCircuitCurrentCoefficient: number;
        };
        /** @description One level of the static test. */
        EfficiencyLevel: {
            /** @description Delivered over available power at rest. Unit: 1. */
            efficiency: number;
            /** @description At which the module gives that power. Unit: W/m2. */
            irradiance: number;
            /** @description Share of the maximum power at 1000 W/m2. Unit: 1. */
            level: number;
            lostByCause: components["schemas"]["LostShareByCause"];
        };
        /** @description One row of a dynamic test. */
        EfficiencyRow: {
            /** @description With 300 s of settling, which does not count. Unit: s. */
            duration: number;
            /** @description Delivered over available energy. Unit: 1. */
            efficiency: number;
            lostByCause: components["schemas"]["LostShareByCause"];
            /** @description How often up and down. Unit: 1. */
            repetitions: number;
            /** @description Slope of the ramps. Unit: W/m2/s. */
            slope: number;
        };
        /** @description A rule's MPPT efficiency by the standard's test. */
        EfficiencyTestAnswer: {
            /** @description By the CEC weights; null for a dynamic test. Unit: 1. */
            cecWeighted: number | null;
            /** @description Of all rows; null for the static test. Unit: s. */
            duration: number | null;
            /** @description The edition whose sequences and weights were used. */
            edition: string;
            /** @description Unweighted mean of the rows; null for the static test. Unit: 1. */
            efficiency: number | null;
            /** @description By the European weights; null for a dynamic test. Unit: 1. */
            europeanWeighted: number | null;
            /** @description Null for a dynamic test. */
            levels: components["schemas"]["EfficiencyLevel"][] | null;
            module: components["schemas"]["ModuleAnswer"];
            provenance: components["schemas"]["Provenance"];
            resolved: components["schemas"]["ResolvedEfficiencyTest"];
            /** @description Null for the static test. */
            rows: components["schemas"]["EfficiencyRow"][] | null;
            test: string;
            trace: components["schemas"]["RowTrace"];
        };
        /** @description One module, one rule, one of the standard's tests. */
        EfficiencyTestRequest: {
            /**
             * @description Cell temperature, constant. Unit: degC.
             * @default 25
             */
            cellTemperature?: number;
            converter?: components["schemas"]["Converter"];
            module: components["schemas"]["Module"];
            rule: components["schemas"]["Rule"];
            /**
             * @description Null: the cells keep cellTemperature, as in the standard.
             * @default null
             */
            temperatureLag?: {
                /** @description Rise of the cells over cellTemperature at rest under 1000 W/m2. Unit: K. */
                rise: number;
                /** @description Time constant of the first-order lag. Unit: s. */
                timeConstant: number;
            } | null;
            /**
             * @description A dynamic sequence of ramps, the start-up ramp, or the static levels.
             * @enum {string}
             */
            test: "dynamic-100-500" | "dynamic-300-1000" | "start-up" | "static";
            /**
             * @description Slope of the row whose course is wanted; null: none. Unit: W/m2/s.
             * @default null
             */
            traceSlope?: number | null;
        };
        /** @description Energies over the whole climate. */
        Energy: {
            /** @description What the array could have given, within the converter's power and current limits. Unit: kWh. */
            available: number;
            /** @description Above the converter's power and current limits; in none of the other figures. Unit: kWh. */
            clipped: number;
            /** @description What the rule took: available minus lost. Unit: kWh. */
            delivered: number;
            /** @description On the plane of the modules. Unit: kWh/m2. */
            insolation: number;
            /** @description The sum of the six causes. Unit: kWh. */
            lost: number;
            /** @description Lost over available; null when nothing was available. Unit: 1. */
            lostFraction: number | null;
            /** @description Delivered over available; null when nothing was available. Unit: 1. */
            trackingEfficiency: number | null;
        };
        /** @description What a kilowatt-hour is worth. */
        EnergyValue: {
            /**
             * @description ISO 4217 code.
             * @example EUR
             */
            currency: string;
            /** @description Worth of a delivered kilowatt-hour. Unit: the currency per kWh. */
            perKilowattHour: number;
        };
        /** @description Energy, its loss by cause, and where it was lost. */
        EstimateAnswer: {
            cautions: components["schemas"]["Caution"][];
            coverage: components["schemas"]["Coverage"];
            energy: components["schemas"]["Energy"];
            /** @description Every class that has samples. */
            irradianceClasses: components["schemas"]["IrradianceClass"][];
            lostByCause: components["schemas"]["LostByCause"];
            module: components["schemas"]["ModuleAnswer"];
            /** @description Every month the climate touches. */
            months: components["schemas"]["Month"][];
            provenance: components["schemas"]["Provenance"];
            resolved: components["schemas"]["ResolvedEstimate"];
            traces: components["schemas"]["Traces"];
        };
        /** @description One module, one array, one rule on a converter, one climate. */
        EstimateRequest: {
            array?: components["schemas"]["ArrayLayout"];
            climate: components["schemas"]["Climate"];
            converter?: components["schemas"]["Converter"];
            /**
             * @description steady: each sample at rest. stepped: every rule at its own control period. auto: stepped up to a step of 300 s, steady above; the answer says which and why.
             * @default auto
             * @enum {string}
             */
            mode?: "auto" | "steady" | "stepped";
            module: components["schemas"]["Module"];
            /**
             * @description Coldest temperature on record at the site, for the caution; null: not known. Unit: degC.
             * @default null
             */
            recordLowTemperature?: number | null;
            rule: components["schemas"]["Rule"];
            /**
             * @description Decimals of the traces. Unit: 1.
             * @default 3
             */
            traceDecimals?: number;
            /**
             * @description Columns of the answer: voltage, current and power; powers; lost energy by cause; none.
             * @default full
             * @enum {string}
             */
            traces?: "full" | "power" | "causes" | "none";
        };
        /** @description Faiman, Prog. Photovolt. 16 (2008) 307-315: t = ta + G/(U0 + U1 w). */
        FaimanModel: {
            /**
             * @description Heat loss of the modules in still air. Unit: W/(m2 K).
             * @default 25
             */
            heatLoss?: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "faiman";
            /**
             * @description Heat loss that each m/s of wind adds. Unit: W s/(m3 K).
             * @default 6.84
             */
            windHeatLoss?: number;
        };
        /** @description Around the optimum, within 0.1 points of its lost fraction. */
        FlatRange: {
            /** @description Lower end. Unit: that of the setting. */
            from: number;
            /** @description Upper end. Unit: that of the setting. */
            to: number;
        };
        /**
         * Fractional open-circuit voltage
         * @description Disconnects the array each sample period, reads its open-circuit voltage and holds a fraction of it until the next sample.
         */
        FractionalOpenCircuitVoltageRule: {
            /**
             * @description Time between two decisions of the rule. Usual: 0.02 to 1. Source: common practice, no source. Unit: s.
             * @default 1
             */
            controlPeriod?: number;
            /**
             * @description Share of the open-circuit voltage that is held. Usual: 0.7 to 0.8. Source: default: Enslin et al. 1997 (from memory); usual range: common practice, no source. Unit: 1, of the sampled open-circuit voltage.
             * @default 0.76
             */
            fraction?: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "fractional-open-circuit-voltage";
            /**
             * @description Reads a pilot cell of its own, fresh at each decision, instead of interrupting the array. Source: common practice, no source.
             * @default false
             */
            pilotCell?: boolean;
            /**
             * @description How long one sample interrupts the power; shorter than the sample period. Usual: 0.001 to 1. Source: common practice, no source. Unit: s.
             * @default 0.256
             */
            sampleDuration?: number;
            /**
             * @description Time from the start of one sample to the start of the next. Usual: 1 to 600. Source: common practice, no source. Unit: s.
             * @default 16
             */
            samplePeriod?: number;
            /**
             * @description Step of the array voltage at each decision; 0 holds the target exactly, more makes the voltage hunt. Usual: 0 to 0.02. Source: common practice, no source. Unit: 1, of the open-circuit voltage at standard test conditions.
             * @default 0
             */
            stepFraction?: number;
        };
        /** @description What the service says of itself. */
        Health: {
            /** @description live or ready. */
            status: string;
        };
        /** @description Irradiance as weather stations have it: global alone (its diffuse part by Erbs et al. 1982), or any two of the three; the plane of the modules is computed. */
        HorizontalIrradiance: {
            /** @description Diffuse irradiance on the horizontal. Unit: W/m2. */
            diffuse?: Column;
            /** @description Direct irradiance facing the sun. Unit: W/m2. */
            directNormal?: Column;
            /** @description Global irradiance on the horizontal. Unit: W/m2. */
            global?: Column;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "horizontal";
            site: components["schemas"]["Site"];
            /**
             * @description How the sky's light is spread: Perez et al. 1990, Hay & Davies 1980, Liu & Jordan 1963.
             * @default perez
             * @enum {string}
             */
            skyModel?: "perez" | "hay-davies" | "isotropic";
        };
        /**
         * Incremental conductance
         * @description Compares dI/dV with -I/V, whose equality marks the peak; rests inside a tolerance and wakes when the current moves.
         */
        IncrementalConductanceRule: {
            /**
             * @description Time between two decisions of the rule. Usual: 0.02 to 1. Source: common practice, no source. Unit: s.
             * @default 0.1
             */
            controlPeriod?: number;
            /**
             * @description Relative change of the current, since it came to rest, that wakes a resting rule. Source: own choice: the resolution of a common current sensor. Unit: 1, of the current.
             * @default 0.001
             */
            currentTolerance?: number;
            /** @description Relative slope of the power curve below which the rule rests; 0 never rests. Default: 10 times stepFraction. Source: own choice: the slope that one step makes on a crystalline silicon curve. Unit: 1, of the relative slope 1 + (V/I) dI/dV. */
            holdTolerance?: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "incremental-conductance";
            /**
             * @description Step of the array voltage at each decision. Usual: 0.002 to 0.03. Source: common practice, no source. Unit: 1, of the open-circuit voltage at standard test conditions.
             * @default 0.01
             */
            stepFraction?: number;
        };
        /** @description Short gaps are filled along a straight line. */
        InterpolateGaps: {
            /** @description Longest gap that is filled; longer ones are left out. Unit: s. */
            interpolateUpTo: number;
        };
        /** @description The light of a climate. */
        Irradiance: components["schemas"]["PlaneOfArrayIrradiance"] | components["schemas"]["HorizontalIrradiance"];
        /** @description The samples of one class of irradiance. */
        IrradianceClass: {
            /** @description What the array could have given. Unit: kWh. */
            available: number;
            /** @description Lower end, inside the class. Unit: W/m2. */
            from: number;
            /** @description Time in the class. Unit: h. */
            hours: number;
            /** @description What was left. Unit: kWh. */
            lost: number;
            /** @description Upper end, outside the class; the last class has all above. Unit: W/m2. */
            to: number;
        };
        /** @description King et al. 2004, SAND2004-3535, eqs. 11 and 12, for one of its five mounts. */
        KingModel: {
            /**
             * @description The back of the modules.
             * @enum {string}
             */
            backing: "glass" | "polymer" | "thin-film-steel";
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "king";
            /**
             * @description How they stand. Measured: glass on open-rack and close-roof, polymer on open-rack and insulated-back, thin-film-steel on open-rack.
             * @enum {string}
             */
            place: "open-rack" | "close-roof" | "insulated-back";
        };
        /** @description At most the ceilings of this document; the operator may lower them. */
        LimitsInForce: {
            /** @description Longest request body, decompressed. Unit: byte. */
            bodyBytes: number;
            /** @description Most candidates of a comparison. Unit: 1. */
            candidates: number;
            /** @description Longest computing of one request, or of one site of a portfolio. Unit: s. */
            computeSeconds: number;
            /** @description Most control periods of all candidates together, or as much other work. Unit: 1. */
            controlPeriods: number;
            /** @description Longest line of a portfolio. Unit: byte. */
            lineBytes: number;
            /** @description Longest the lines of its named climates may be together. Unit: byte. */
            namedClimateBytes: number;
            /** @description Most named climates of a portfolio. Unit: 1. */
            namedClimates: number;
            /** @description Most samples of a climate. Unit: 1. */
            samples: number;
            /** @description Most sites of a portfolio. Unit: 1. */
            sites: number;
        };
        /** @description The setting as sent, or its default at the first site. */
        LossAt: {
            /** @description Lost energy at it. Unit: kWh. */
            lost: number;
            /** @description Lost over available; null when nothing was available. Unit: 1. */
            lostFraction: number | null;
            /** @description Value of the setting. Unit: that of the setting. */
            value: number;
        };
        /** @description Lost energy by cause; the six add up to what is lost. One may be negative. */
        LostByCause: {
            /** @description The reference is stale: held from the last sample. Unit: kWh. */
            heldSample: number;
            /** @description Nothing is delivered while sampling, sweeping or asleep. Unit: kWh. */
            interruption: number;
            /** @description Steps, hunting and ripple around the target. Unit: kWh. */
            regulation: number;
            /** @description The rule's own target misses the maximum. Unit: kWh. */
            setPoint: number;
            /** @description The maximum lies outside the converter's voltage window. Unit: kWh. */
            voltageWindow: number;
            /** @description The rule sits on a lower peak of the power curve. Unit: kWh. */
            wrongPeak: number;
        };
        /** @description Lost power by cause; the six add up to what is lost. */
        LostPowerByCause: {
            /** @description The reference is stale: held from the last sample. Unit: W. */
            heldSample: number;
            /** @description Nothing is delivered while sampling, sweeping or asleep. Unit: W. */
            interruption: number;
            /** @description Steps, hunting and ripple around the target. Unit: W. */
            regulation: number;
            /** @description The rule's own target misses the maximum. Unit: W. */
            setPoint: number;
            /** @description The maximum lies outside the converter's voltage window. Unit: W. */
            voltageWindow: number;
            /** @description The rule sits on a lower peak of the power curve. Unit: W. */
            wrongPeak: number;
        };
        /** @description Lost shares of the available energy by cause. */
        LostShareByCause: {
            /** @description The reference is stale: held from the last sample. Unit: 1. */
            heldSample: number;
            /** @description Nothing is delivered while sampling, sweeping or asleep. Unit: 1. */
            interruption: number;
            /** @description Steps, hunting and ripple around the target. Unit: 1. */
            regulation: number;
            /** @description The rule's own target misses the maximum. Unit: 1. */
            setPoint: number;
            /** @description The maximum lies outside the converter's voltage window. Unit: 1. */
            voltageWindow: number;
            /** @description The rule sits on a lower peak of the power curve. Unit: 1. */
            wrongPeak: number;
        };
        /** @description Null for a datasheet. */
        MeasuredCircuit: {
            /** @description n Ns k T/q of the whole module. Unit: V. */
            idealityVoltage: number;
            /** @description Photocurrent. Unit: A. */
            photocurrent: number;
            /** @description Saturation current. Unit: A. */
            saturationCurrent: number;
            /** @description Series resistance. Unit: ohm. */
            seriesResistance: number;
            /** @description Shunt resistance; null: infinite. Unit: ohm. */
            shuntResistance: number | null;
        } | null;
        /** @description Points of a measured I-V curve of one module. */
        MeasuredCurve: {
            /**
             * @description Band gap of the cells at 25 degC; silicon by default. Unit: eV.
             * @default 1.121
             */
            bandgap?: number;
            /**
             * @description Relative change of the band gap; silicon by default. Unit: 1/K.
             * @default -0.0002677
             */
            bandgapCoefficient?: number;
            /** @description Cells in series inside the module. Unit: 1. */
            cellsInSeries: number;
            /** @description Cell temperature during the measurement. Unit: degC. */
            cellTemperature: number;
            /** @description Current, positive while the module delivers, point by point. Unit: A. */
            current: Column;
            /** @description Irradiance during the measurement. Unit: W/m2. */
            irradiance: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "measured-curve";
            /**
             * @description Change of the photocurrent with temperature. Unit: %/K.
             * @default 0
             */
            photocurrentCoefficient?: number;
            /** @description Terminal voltage, point by point. Unit: V. */
            voltage: Column;
        };
        /** @description Null where no datasheet was fitted. */
        Misfits: {
            /** @description Relative misfit of the current at Vmp. Unit: 1. */
            maximumPowerCurrent: number;
            /** @description Slope of the power curve at Vmp over Imp; 0 at a maximum. Unit: 1. */
            maximumPowerSlope: number;
            /** @description Relative misfit of Voc. Unit: 1. */
            openCircuitVoltage: number;
            /** @description Relative misfit of the change of Voc over 10 K. Unit: 1. */
            openCircuitVoltageCoefficient: number;
            /** @description Relative misfit of Isc. Unit: 1. */
            shortCircuitCurrent: number;
        } | null;
        /** @description A model the figures rest on. */
        Model: {
            name: string;
            source: string;
            /** @description Raised when the model's figures change. */
            version: string;
        };
        /** @description One photovoltaic module. */
        Module: components["schemas"]["DatasheetModule"] | components["schemas"]["SingleDiodeModule"] | components["schemas"]["TestGeneratorModule"];
        /** @description How the module was understood. */
        ModuleAnswer: {
            circuit: components["schemas"]["Circuit"];
            /** @description exact, nearest (within 2 % of every condition), or given. */
            fit: string;
            misfits: components["schemas"]["Misfits"];
        };
        /** @description The circuit of a module and how well it fits. */
        ModuleFitAnswer: {
            circuit: components["schemas"]["Circuit"] & unknown;
            /** @description exact, nearest (within 2 % of every condition), or measured. */
            fit: string;
            measured: components["schemas"]["MeasuredCircuit"];
            misfits: components["schemas"]["Misfits"] & unknown;
            provenance: components["schemas"]["Provenance"];
            /** @description Of model current minus measured current; null for a datasheet. Unit: A. */
            rootMeanSquareError: number | null;
            standard: components["schemas"]["StandardPoint"];
        };
        /** @description A module whose circuit is sought. */
        ModuleFitRequest: {
            module: components["schemas"]["ModuleToFit"];
        };
        /** @description What is known of the module. */
        ModuleToFit: components["schemas"]["DatasheetModule"] | components["schemas"]["MeasuredCurve"];
        /** @description One calendar month. */
        Month: {
            /** @description What the array could have given. Unit: kWh. */
            available: number;
            /** @description What the rule took. Unit: kWh. */
            delivered: number;
            /** @description The difference. Unit: kWh. */
            lost: number;
            lostByCause: components["schemas"]["LostByCause"];
            /**
             * @description Year and month by the clock of the climate's start.
             * @example 2025-01
             */
            month: string;
        };
        /** @description A climate that a line above gives by name. */
        NamedClimate: {
            /** @enum {string} */
            kind: "named";
            /**
             * @description Of a climate line above.
             * @example Cold Bay
             */
            name: string;
        };
        /** @description Nominal operating cell temperature: t = ta + (NOCT - 20)/800 G, in any wind. */
        NoctModel: {
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "noct";
            /** @description Cell temperature at 800 W/m2, 20 degC and 1 m/s. Unit: degC. */
            nominalOperatingCellTemperature: number;
        };
        /**
         * Perfect tracking
         * @description The maximum of the power curve inside the converter's voltage window, without ripple, sensor error or waiting. Loses only what the window costs.
         */
        PerfectRule: {
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "perfect";
        };
        /**
         * Perturb and observe
         * @description Steps the voltage at each decision and turns when the power fell. Never rests; moving light can mislead it.
         */
        PerturbAndObserveRule: {
            /**
             * @description Time between two decisions of the rule. Usual: 0.02 to 1. Source: common practice, no source. Unit: s.
             * @default 0.1
             */
            controlPeriod?: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "perturb-and-observe";
            /**
             * @description Step of the array voltage at each decision. Usual: 0.002 to 0.03. Source: common practice, no source. Unit: 1, of the open-circuit voltage at standard test conditions.
             * @default 0.01
             */
            stepFraction?: number;
        };
        /** @description Irradiance on the tilted plane of the modules. */
        PlaneOfArrayIrradiance: {
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "plane-of-array";
            /** @description Irradiance on the plane of the modules; readings down to -10 at night count as 0. Unit: W/m2. */
            values: Column;
        };
        /** @description One operating point a sample; voltage and current only in full traces. */
        PointTrace: {
            /** @description Current, mean over the sample. Unit: A. */
            current?: (number | null)[];
            /** @description Power, mean over the sample, interruptions counted. Unit: W. */
            power: (number | null)[];
            /** @description Voltage at the converter's terminals. Unit: V. */
            voltage?: (number | null)[];
        };
        /** @description Why the rest was given up; the last line. Results above stay good, sites without one were not answered. */
        PortfolioAborted: {
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "aborted";
            /** @description Last line of the request that was begun. Unit: 1. */
            line: number;
            problem: components["schemas"]["Problem"];
        };
        /** @description One candidate's figures at one site. */
        PortfolioCandidate: {
            /** @description Delivered more than the baseline. Unit: kWh. */
            differenceToBaseline: number;
            /** @description Delivered against the best candidate: 0 or below. Unit: kWh. */
            differenceToBest: number;
            energy: components["schemas"]["Energy"];
            label: string;
            lostByCause: components["schemas"]["LostByCause"];
            /** @description In which the worth pays the price above the baseline's; null where there is none. Unit: years. */
            payback: number | null;
            /** @description From 1, by delivered energy; equals share a rank. Unit: 1. */
            rank: number;
            /** @description Lost by not choosing the site's own best: 0 or above. Unit: kWh. */
            regret: number;
            /** @description Of the difference to the baseline. Unit: the currency of energyValue. */
            worthPerYear: number | null;
        };
        /** @description A climate that many sites share, given once and named by each. */
        PortfolioClimate: {
            climate: components["schemas"]["Climate"];
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "climate";
            /**
             * @description By which sites below name this climate.
             * @example Cold Bay
             */
            name: string;
        };
        /** @description What sites share; only the first line may be one. A site's own member takes the place of the whole member here. */
        PortfolioDefaults: {
            array?: components["schemas"]["ArrayLayout"];
            /**
             * @description Label of the candidate the others are compared with; left out: the first.
             * @example hold a fraction
             */
            baseline?: string;
            /** @description 2 to 24 rules on converters; `converter` above holds for those without their own. */
            candidates?: components["schemas"]["Candidate"][];
            /** @description The climate itself, or the name of one given by a line above. */
            climate?: components["schemas"]["Climate"] | components["schemas"]["NamedClimate"];
            converter?: components["schemas"]["Converter"];
            /** @description How many such sites there are: the totals count it as often. 1 when left out. Unit: 1. */
            count?: number;
            energyValue?: components["schemas"]["EnergyValue"];
            /**
             * @description Group whose totals the site is added to besides the whole.
             * @example north
             */
            group?: string;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "defaults";
            /**
             * @description steady: each sample at rest. stepped: every rule at its own control period. auto: stepped up to a step of 300 s, steady above; the answer says which and why.
             * @enum {string}
             */
            mode?: "auto" | "steady" | "stepped";
            module?: components["schemas"]["Module"];
            /** @description Coldest temperature on record at the site, for the caution; null: not known. Unit: degC. */
            recordLowTemperature?: number | null;
        };
        /** @description The totals of one group. */
        PortfolioGroupTotals: {
            group: string;
            labels: components["schemas"]["PortfolioLabelTotals"][];
        };
        /** @description One line of a portfolio's request. */
        PortfolioInputLine: components["schemas"]["PortfolioDefaults"] | components["schemas"]["PortfolioClimate"] | components["schemas"]["PortfolioSite"];
        /** @description One candidate over many sites, each times its count. */
        PortfolioLabelTotals: {
            /** @description What the arrays could have given. Unit: kWh. */
            available: number;
            /** @description What the candidate took. Unit: kWh. */
            delivered: number;
            label: string;
            /** @description What it left. Unit: kWh. */
            lost: number;
            lostByCause: components["schemas"]["LostByCause"];
            /** @description Lost over available; null when nothing was available. Unit: 1. */
            lostFraction: number | null;
            /** @description Lost by this candidate everywhere instead of each site's own best. Unit: kWh. */
            regret: number;
            /** @description Sites that had this candidate, each times its count. Unit: 1. */
            sites: number;
        };
        /** @description One line of a portfolio's answer; kinds may be added. Empty lines only keep the connection open. */
        PortfolioOutputLine: components["schemas"]["PortfolioResult"] | components["schemas"]["PortfolioSiteProblem"] | components["schemas"]["PortfolioAborted"] | components["schemas"]["PortfolioTotals"];
        /** @description What the candidates come to at one site. Lines come as sites are done. */
        PortfolioResult: {
            /** @description Label of the candidate the others are compared with. */
            baseline: string;
            cautions: components["schemas"]["Caution"][];
            /** @description How often the totals count the site. Unit: 1. */
            count: number;
            coverage: components["schemas"]["Coverage"];
            group: string | null;
            id: string;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "result";
            /** @description steady or stepped. */
            mode: string;
            /** @description Of one such site, in the order of the candidates. */
            results: components["schemas"]["PortfolioCandidate"][];
            /** @description Why no worth per year can be said; null when it can. */
            worthReason: string | null;
        };
        /** @description One site. With what it has from the defaults it needs a module, candidates and a climate, and is then compared as by `compare`. */
        PortfolioSite: {
            array?: components["schemas"]["ArrayLayout"];
            /**
             * @description Label of the candidate the others are compared with; left out: the first.
             * @example hold a fraction
             */
            baseline?: string;
            /** @description 2 to 24 rules on converters; `converter` above holds for those without their own. */
            candidates?: components["schemas"]["Candidate"][];
            /** @description The climate itself, or the name of one given by a line above. */
            climate?: components["schemas"]["Climate"] | components["schemas"]["NamedClimate"];
            converter?: components["schemas"]["Converter"];
            /** @description How many such sites there are: the totals count it as often. 1 when left out. Unit: 1. */
            count?: number;
            energyValue?: components["schemas"]["EnergyValue"];
            /**
             * @description Group whose totals the site is added to besides the whole.
             * @example north
             */
            group?: string;
            /**
             * @description Of the site in its answer; each id once.
             * @example Heron Bank
             */
            id: string;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "site";
            /**
             * @description steady: each sample at rest. stepped: every rule at its own control period. auto: stepped up to a step of 300 s, steady above; the answer says which and why.
             * @enum {string}
             */
            mode?: "auto" | "steady" | "stepped";
            module?: components["schemas"]["Module"];
            /** @description Coldest temperature on record at the site, for the caution; null: not known. Unit: degC. */
            recordLowTemperature?: number | null;
        };
        /** @description Why a line got no result; the others are not touched. Its pointers lead into the line as it is with the defaults. A climate line that is refused gets one too, with no id; the totals do not count it, and each site that names it is refused. */
        PortfolioSiteProblem: {
            /** @description Null where the line has none that will do. */
            id: string | null;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "site-problem";
            /** @description Of the request, from 1; empty lines count. Unit: 1. */
            line: number;
            problem: components["schemas"]["Problem"];
        };
        /** @description What the portfolio comes to, in any order of its sites; the last line. Without it the answer was cut. */
        PortfolioTotals: {
            /** @description Result lines above. Unit: 1. */
            answered: number;
            /** @description Label that delivers most of those at every answered site; null: there is none. */
            best: string | null;
            /** @description In the order of their names; sites without a group are only in the whole. */
            groups: components["schemas"]["PortfolioGroupTotals"][];
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "totals";
            /** @description By label, in the order of their names. */
            labels: components["schemas"]["PortfolioLabelTotals"][];
            /** @description Sites with a problem in place of a result. Unit: 1. */
            refused: number;
            /** @description Lines that were meant as sites: answered and refused ones. Unit: 1. */
            sites: number;
            /** @description Of the service that computed the answer. */
            version: string;
            /** @description The 20 sites that lose most under their baseline, the largest loss first. */
            worst: components["schemas"]["PortfolioWorstSite"][];
        };
        /** @description A site that loses much under its baseline. */
        PortfolioWorstSite: {
            id: string;
            /** @description The site's baseline. */
            label: string;
            /** @description Lost under it, times the site's count. Unit: kWh. */
            lost: number;
            /** @description Lost over available; null when nothing was available. Unit: 1. */
            lostFraction: number | null;
        };
        /**
         * Power curve scan
         * @description Sweeps the whole window each scan period, nothing delivered meanwhile, then holds the best voltage or climbs from it.
         */
        PowerCurveScanRule: {
            /**
             * @description What follows a sweep: climb from the best voltage by comparing powers, or hold it. Source: common practice, no source.
             * @default climb
             * @enum {string}
             */
            afterwards?: "climb" | "hold";
            /**
             * @description Time between two decisions of the rule. Usual: 0.02 to 1. Source: common practice, no source. Unit: s.
             * @default 0.1
             */
            controlPeriod?: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "power-curve-scan";
            /**
             * @description Voltages tried in one sweep, equally spaced over the window inside 0 V to open circuit. Usual: 50 to 200. Source: common practice, no source. Unit: 1.
             * @default 100
             */
            points?: number;
            /**
             * @description Time from the start of one sweep to the start of the next. Usual: 60 to 3600. Source: common practice, no source. Unit: s.
             * @default 600
             */
            scanPeriod?: number;
            /**
             * @description Step of the array voltage at each decision. Usual: 0.002 to 0.03. Source: common practice, no source. Unit: 1, of the open-circuit voltage at standard test conditions.
             * @default 0.01
             */
            stepFraction?: number;
            /**
             * @description How long one sweep takes, nothing being delivered: an upper bound of its cost. Shorter than the scan period. Usual: 0.1 to 5. Source: common practice, no source. Unit: s.
             * @default 2
             */
            sweepDuration?: number;
        };
        /** @description Why there is no answer, and what to change (RFC 9457). */
        Problem: {
            /** @description One of: malformed-body, malformed-request, unauthorized, not-found, method-not-allowed, not-acceptable, too-slow, body-too-large, unsupported-media-type, invalid-request, too-much-work, time-limit-exceeded, headers-too-large, internal, worker-lost, overloaded, draining, warming; more may come, none changes its meaning. */
            code: string;
            detail: string;
            /** @description How many errors there are. Unit: 1. */
            errorCount: number;
            /** @description The first 20 of them. */
            errors: components["schemas"]["ProblemError"][];
            /** @description As in the x-request-id header; finds the request in the log. */
            requestId: string;
            /** @description The HTTP status. Unit: 1. */
            status: number;
            title: string;
            /** @description urn:kneegap:problem: and the code. */
            type: string;
        };
        /** @description One thing to change in the request. */
        ProblemError: {
            /** @description What kind of error this is. */
            code: string;
            /** @description What is wrong and what to change. */
            detail: string;
            /** @description What would be right, where that can be said. */
            expected?: string;
            /**
             * @description JSON pointer (RFC 6901) into the request.
             * @example /climate/step
             */
            pointer: string;
        };
        /** @description What the figures rest on. */
        Provenance: {
            /** @description SHA-256 of the resolved request without presentation members: JSON with sorted keys and no spaces, in which each column stands as [n] followed by n little-endian doubles. */
            inputDigest: string;
            models: components["schemas"]["Model"][];
            /** @description Of the service that computed the answer. */
            version: string;
        };
        /** @description The array as it was computed, every default filled in. */
        ResolvedArrayLayout: {
            /** @description Modules in series in each string. Unit: 1. */
            modulesInSeries: number;
            /** @description Strings in parallel. Unit: 1. */
            stringsInParallel: number;
            /** @description Resistance between array and converter. Unit: ohm. */
            wiringResistance: number;
        };
        /** @description Battery-coupled, every default filled in. */
        ResolvedBatteryCoupledRule: {
            /** @description Battery voltage at the converter's terminals: one value, or one a sample of the climate. Null where one value a sample was sent. Unit: V. */
            batteryVoltage: number | null;
            /** @description Time between two decisions of the rule. Unit: s. */
            controlPeriod: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "battery-coupled";
            /** @description Voltage drop between the array's terminals and the battery (blocking diode, switch, fuse). Unit: V. */
            pathDrop: number;
            /** @description Step of the array voltage at each decision; 0 holds the target exactly, more makes the voltage hunt. Unit: 1, of the open-circuit voltage at standard test conditions. */
            stepFraction: number;
        };
        /** @description A candidate as it was computed, every default filled in. */
        ResolvedCandidate: {
            converter: components["schemas"]["ResolvedConverter"];
            label: string;
            /** @description Price of this candidate's converter; null: not given. Unit: the currency of energyValue. */
            price: number | null;
            rule: components["schemas"]["ResolvedRule"];
        };
        /** @description What was computed, every default filled in. */
        ResolvedComparison: {
            array: components["schemas"]["ResolvedArrayLayout"];
            /** @description Label of the candidate the others are compared with. */
            baseline: string;
            candidates: components["schemas"]["ResolvedCandidate"][];
            energyValue: components["schemas"]["ResolvedEnergyValue"];
            mode: string;
            modeReason: string;
        };
        /** @description Constant voltage, every default filled in. */
        ResolvedConstantVoltageRule: {
            /** @description Time between two decisions of the rule. Unit: s. */
            controlPeriod: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "constant-voltage";
            /** @description Voltage held, per module in series. Unit: V. */
            setVoltagePerModule: number;
            /** @description Step of the array voltage at each decision; 0 holds the target exactly, more makes the voltage hunt. Unit: 1, of the open-circuit voltage at standard test conditions. */
            stepFraction: number;
        };
        /** @description The converter as it was computed, every default filled in. */
        ResolvedConverter: {
            /** @description Highest voltage the input bears; null: not known. Unit: V. */
            inputVoltageRating: number | null;
            /** @description Most the input takes; null: no limit. Unit: A. */
            maximumCurrent: number | null;
            /** @description Most the input takes; null: no limit. Unit: W. */
            maximumPower: number | null;
            resolution: components["schemas"]["ResolvedSensorResolution"];
            /** @description Amplitude of the voltage ripple over the voltage. Unit: 1. */
            rippleAmplitude: number;
            sensorError: components["schemas"]["ResolvedSensorError"];
            /** @description Upper end of the voltage window; null: none. Unit: V. */
            trackingMaximumVoltage: number | null;
            /** @description Lower end of the voltage window. Unit: V. */
            trackingMinimumVoltage: number;
            /** @description Asleep while the array could give less. Unit: W. */
            wakePower: number;
        };
        /** @description What was computed, every default filled in. */
        ResolvedEfficiencyTest: {
            converter: components["schemas"]["ResolvedConverter"];
            rule: components["schemas"]["ResolvedRule"];
        };
        /** @description Null when not given. */
        ResolvedEnergyValue: {
            currency: string;
            /** @description As it was sent. Unit: the currency per kWh. */
            perKilowattHour: number;
        } | null;
        /** @description What was computed, every default filled in. */
        ResolvedEstimate: {
            array: components["schemas"]["ResolvedArrayLayout"];
            converter: components["schemas"]["ResolvedConverter"];
            mode: string;
            modeReason: string;
            rule: components["schemas"]["ResolvedRule"];
        };
        /** @description Fractional open-circuit voltage, every default filled in. */
        ResolvedFractionalOpenCircuitVoltageRule: {
            /** @description Time between two decisions of the rule. Unit: s. */
            controlPeriod: number;
            /** @description Share of the open-circuit voltage that is held. Unit: 1, of the sampled open-circuit voltage. */
            fraction: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "fractional-open-circuit-voltage";
            /** @description Reads a pilot cell of its own, fresh at each decision, instead of interrupting the array. */
            pilotCell: boolean;
            /** @description How long one sample interrupts the power; shorter than the sample period. Unit: s. */
            sampleDuration: number;
            /** @description Time from the start of one sample to the start of the next. Unit: s. */
            samplePeriod: number;
            /** @description Step of the array voltage at each decision; 0 holds the target exactly, more makes the voltage hunt. Unit: 1, of the open-circuit voltage at standard test conditions. */
            stepFraction: number;
        };
        /** @description Incremental conductance, every default filled in. */
        ResolvedIncrementalConductanceRule: {
            /** @description Time between two decisions of the rule. Unit: s. */
            controlPeriod: number;
            /** @description Relative change of the current, since it came to rest, that wakes a resting rule. Unit: 1, of the current. */
            currentTolerance: number;
            /** @description Relative slope of the power curve below which the rule rests; 0 never rests. Unit: 1, of the relative slope 1 + (V/I) dI/dV. */
            holdTolerance: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "incremental-conductance";
            /** @description Step of the array voltage at each decision. Unit: 1, of the open-circuit voltage at standard test conditions. */
            stepFraction: number;
        };
        /** @description Perfect tracking, every default filled in. */
        ResolvedPerfectRule: {
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "perfect";
        };
        /** @description Perturb and observe, every default filled in. */
        ResolvedPerturbAndObserveRule: {
            /** @description Time between two decisions of the rule. Unit: s. */
            controlPeriod: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "perturb-and-observe";
            /** @description Step of the array voltage at each decision. Unit: 1, of the open-circuit voltage at standard test conditions. */
            stepFraction: number;
        };
        /** @description Power curve scan, every default filled in. */
        ResolvedPowerCurveScanRule: {
            /** @description What follows a sweep: climb from the best voltage by comparing powers, or hold it. */
            afterwards: string;
            /** @description Time between two decisions of the rule. Unit: s. */
            controlPeriod: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "power-curve-scan";
            /** @description Voltages tried in one sweep, equally spaced over the window inside 0 V to open circuit. Unit: 1. */
            points: number;
            /** @description Time from the start of one sweep to the start of the next. Unit: s. */
            scanPeriod: number;
            /** @description Step of the array voltage at each decision. Unit: 1, of the open-circuit voltage at standard test conditions. */
            stepFraction: number;
            /** @description How long one sweep takes, nothing being delivered: an upper bound of its cost. Shorter than the scan period. Unit: s. */
            sweepDuration: number;
        };
        /** @description The rule as it was computed, every default filled in. */
        ResolvedRule: components["schemas"]["ResolvedPerfectRule"] | components["schemas"]["ResolvedConstantVoltageRule"] | components["schemas"]["ResolvedTemperatureCompensatedVoltageRule"] | components["schemas"]["ResolvedFractionalOpenCircuitVoltageRule"] | components["schemas"]["ResolvedShortCurrentPulseRule"] | components["schemas"]["ResolvedBatteryCoupledRule"] | components["schemas"]["ResolvedPerturbAndObserveRule"] | components["schemas"]["ResolvedIncrementalConductanceRule"] | components["schemas"]["ResolvedPowerCurveScanRule"];
        /** @description Errors of the converter's sensors. */
        ResolvedSensorError: {
            /** @description Reading over true current, minus 1. Unit: 1. */
            currentGain: number;
            /** @description Offset over the array's short-circuit current. Unit: 1. */
            currentOffset: number;
            /** @description Reading over true voltage, minus 1. Unit: 1. */
            voltageGain: number;
            /** @description Offset over the array's open-circuit voltage. Unit: 1. */
            voltageOffset: number;
        };
        /** @description Steps of the converter's sensors. */
        ResolvedSensorResolution: {
            /** @description Step over the array's short-circuit current; 0: not rounded. Unit: 1. */
            current: number;
            /** @description Step over the array's open-circuit voltage; 0: not rounded. Unit: 1. */
            voltage: number;
        };
        /** @description Short-current pulse, every default filled in. */
        ResolvedShortCurrentPulseRule: {
            /** @description Time between two decisions of the rule. Unit: s. */
            controlPeriod: number;
            /** @description Share of the short-circuit current that is held. Unit: 1, of the sampled short-circuit current. */
            fraction: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "short-current-pulse";
            /** @description Reads a pilot cell of its own, fresh at each decision, instead of interrupting the array. */
            pilotCell: boolean;
            /** @description How long one sample interrupts the power; shorter than the sample period. Unit: s. */
            sampleDuration: number;
            /** @description Time from the start of one sample to the start of the next. Unit: s. */
            samplePeriod: number;
            /** @description Step of the array voltage at each decision; 0 holds the target exactly, more makes the voltage hunt. Unit: 1, of the open-circuit voltage at standard test conditions. */
            stepFraction: number;
        };
        /** @description Temperature-compensated voltage, every default filled in. */
        ResolvedTemperatureCompensatedVoltageRule: {
            /** @description Change of the held voltage with cell temperature. Unit: %/K, of the set voltage. */
            coefficient: number;
            /** @description Time between two decisions of the rule. Unit: s. */
            controlPeriod: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "temperature-compensated-voltage";
            /** @description Voltage held at a cell temperature of 25 degC, per module in series. Unit: V. */
            setVoltagePerModule: number;
            /** @description Step of the array voltage at each decision; 0 holds the target exactly, more makes the voltage hunt. Unit: 1, of the open-circuit voltage at standard test conditions. */
            stepFraction: number;
        };
        /** @description Null where no row was asked for. */
        RowTrace: {
            /** @description At the start of each span; straight between. The first 300 s settle. Unit: W/m2. */
            irradiance: (number | null)[];
            /** @description Least delivered by a control period in each span. Unit: W. */
            leastPower: (number | null)[];
            /** @description Least of the control periods in each span. Unit: V. */
            leastVoltage: (number | null)[];
            maximumPower: components["schemas"]["PointTrace"];
            /** @description Most delivered by a control period in each span. Unit: W. */
            mostPower: (number | null)[];
            /** @description Most of the control periods in each span. Unit: V. */
            mostVoltage: (number | null)[];
            operating: components["schemas"]["PointTrace"];
            /** @description Of the row shown. Unit: W/m2/s. */
            slope: number;
            /** @description Length of one span, at most 1 s. Unit: s. */
            step: number;
        } | null;
        /** @description How the converter decides the array voltage, with the rule's settings. */
        Rule: components["schemas"]["PerfectRule"] | components["schemas"]["ConstantVoltageRule"] | components["schemas"]["TemperatureCompensatedVoltageRule"] | components["schemas"]["FractionalOpenCircuitVoltageRule"] | components["schemas"]["ShortCurrentPulseRule"] | components["schemas"]["BatteryCoupledRule"] | components["schemas"]["PerturbAndObserveRule"] | components["schemas"]["IncrementalConductanceRule"] | components["schemas"]["PowerCurveScanRule"];
        /** @description Every tracking rule with its parameters. */
        RuleCatalogue: {
            rules: components["schemas"]["RuleDescription"][];
        };
        /** @description One tracking rule. */
        RuleDescription: {
            description: string;
            /** @description What interrupts the power: nothing, open-circuit, short-circuit or sweep. */
            interrupts: string;
            kind: string;
            parameters: components["schemas"]["RuleParameter"][];
            sources: string[];
            title: string;
        };
        /** @description One setting of a rule. */
        RuleParameter: {
            choices: string[] | null;
            /** @description Null where it is derived or where there is none. */
            default: number | boolean | string | null;
            /** @description In words, where the default follows from the array. */
            derivedDefault: string | null;
            description: string;
            /** @description Must be above this. Unit: that of the parameter. */
            exclusiveMinimum: number | null;
            /** @description True where only whole numbers will do. */
            integer: boolean;
            /** @description Unit: that of the parameter. */
            maximum: number | null;
            /** @description Unit: that of the parameter. */
            minimum: number | null;
            /** @description The member's name in a request. */
            name: string;
            /** @description True where there is no default. */
            required: boolean;
            /** @description Where default and usual range come from. */
            source: string;
            /** @description number, flag, choice, or series (a number or one a sample). */
            type: string;
            /** @description Null for flags and choices. */
            unit: string | null;
            usual: components["schemas"]["UsualRange"];
        };
        /** @description Where a rule sits at rest. */
        RulePlace: {
            /** @description Mean current, interruptions counted. Unit: A. */
            current: number;
            /** @description What it leaves of the maximum. Unit: W. */
            lost: number;
            lostByCause: components["schemas"]["LostPowerByCause"];
            /** @description Mean power delivered, interruptions counted. Unit: W. */
            power: number;
            rule: components["schemas"]["ResolvedRule"];
            /** @description Mean voltage it holds at rest. Unit: V. */
            voltage: number;
        };
        /** @description Errors of the converter's sensors; none by default. */
        SensorError: {
            /**
             * @description Reading over true current, minus 1. Unit: 1.
             * @default 0
             */
            currentGain?: number;
            /**
             * @description Added to the current reading. Unit: 1, of the array's short-circuit current at standard test conditions.
             * @default 0
             */
            currentOffset?: number;
            /**
             * @description Reading over true voltage, minus 1. Unit: 1.
             * @default 0
             */
            voltageGain?: number;
            /**
             * @description Added to the voltage reading. Unit: 1, of the array's open-circuit voltage at standard test conditions.
             * @default 0
             */
            voltageOffset?: number;
        };
        /** @description Steps of the converter's sensors; none by default. */
        SensorResolution: {
            /**
             * @description Step the current reading is rounded to; 0: not rounded. Unit: 1, of the array's short-circuit current at standard test conditions.
             * @default 0
             */
            current?: number;
            /**
             * @description Step the voltage reading is rounded to; 0: not rounded. Unit: 1, of the array's open-circuit voltage at standard test conditions.
             * @default 0
             */
            voltage?: number;
        };
        /**
         * Short-current pulse
         * @description Short-circuits the array each sample period, reads its short-circuit current and holds a fraction of it until the next pulse.
         */
        ShortCurrentPulseRule: {
            /**
             * @description Time between two decisions of the rule. Usual: 0.02 to 1. Source: common practice, no source. Unit: s.
             * @default 1
             */
            controlPeriod?: number;
            /**
             * @description Share of the short-circuit current that is held. Usual: 0.78 to 0.92. Source: default: Noguchi et al. 2002 (from memory); usual range: Esram & Chapman 2007 (from memory). Unit: 1, of the sampled short-circuit current.
             * @default 0.92
             */
            fraction?: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "short-current-pulse";
            /**
             * @description Reads a pilot cell of its own, fresh at each decision, instead of interrupting the array. Source: common practice, no source.
             * @default false
             */
            pilotCell?: boolean;
            /**
             * @description How long one sample interrupts the power; shorter than the sample period. Usual: 0.001 to 1. Source: common practice, no source. Unit: s.
             * @default 0.032
             */
            sampleDuration?: number;
            /**
             * @description Time from the start of one sample to the start of the next. Usual: 1 to 600. Source: common practice, no source. Unit: s.
             * @default 16
             */
            samplePeriod?: number;
            /**
             * @description Step of the array voltage at each decision; 0 holds the target exactly, more makes the voltage hunt. Usual: 0 to 0.02. Source: common practice, no source. Unit: 1, of the open-circuit voltage at standard test conditions.
             * @default 0
             */
            stepFraction?: number;
        };
        /** @description A module by the parameters of its single-diode circuit at 1000 W/m2 and 25 degC. */
        SingleDiodeModule: {
            /**
             * @description Band gap of the cells at 25 degC; silicon by default. Unit: eV.
             * @default 1.121
             */
            bandgap?: number;
            /**
             * @description Relative change of the band gap with temperature; silicon by default. Unit: 1/K.
             * @default -0.0002677
             */
            bandgapCoefficient?: number;
            /** @description Cells in series inside the module. Unit: 1. */
            cellsInSeries: number;
            /** @description n Ns k T/q of the whole module at 25 degC (about 0.026 V to 0.05 V a cell). Unit: V. */
            idealityVoltage: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "single-diode";
            /** @description Photocurrent at standard test conditions. Unit: A. */
            photocurrent: number;
            /**
             * @description Change of the photocurrent with temperature. Unit: %/K.
             * @default 0
             */
            photocurrentCoefficient?: number;
            /** @description Saturation current of the diode at 25 degC. Unit: A. */
            saturationCurrent: number;
            /** @description Series resistance of the module. Unit: ohm. */
            seriesResistance: number;
            /** @description Shunt resistance of the module at 1000 W/m2; null: infinite. Unit: ohm. */
            shuntResistance: number | null;
        };
        /** @description Where the modules stand and how their plane lies. */
        Site: {
            /**
             * @description Share of the light that the ground throws back. Unit: 1.
             * @default 0.2
             */
            albedo?: number;
            /** @description Of the modules' plane, clockwise from north: 180 faces south. Unit: degrees. */
            azimuth: number;
            /**
             * @description Above sea level. Unit: m.
             * @default 0
             */
            elevation?: number;
            /** @description North positive. Unit: degrees. */
            latitude: number;
            /** @description East positive. Unit: degrees. */
            longitude: number;
            /** @description Of the modules' plane from the horizontal. Unit: degrees. */
            tilt: number;
        };
        /** @description The fitted circuit at 1000 W/m2 and 25 degC. */
        StandardPoint: {
            /** @description Maximum power. Unit: W. */
            maximumPower: number;
            /** @description Current at maximum power. Unit: A. */
            maximumPowerCurrent: number;
            /** @description Voltage at maximum power. Unit: V. */
            maximumPowerVoltage: number;
            /** @description Open-circuit voltage. Unit: V. */
            openCircuitVoltage: number;
            /** @description Change of the open-circuit voltage over 10 K. Unit: %/K. */
            openCircuitVoltageCoefficient: number;
            /** @description Short-circuit current. Unit: A. */
            shortCircuitCurrent: number;
        };
        /** @description The temperature of a climate. */
        Temperature: components["schemas"]["CellTemperature"] | components["schemas"]["AmbientTemperature"];
        /**
         * Temperature-compensated voltage
         * @description Holds a set voltage per module, corrected by a coefficient times the cell temperature's distance from 25 degC.
         */
        TemperatureCompensatedVoltageRule: {
            /** @description Change of the held voltage with cell temperature. Usual: -0.6 to -0.2. Default: the module's change of open-circuit voltage in V/K, over the set voltage. Source: common practice, no source. Unit: %/K, of the set voltage. */
            coefficient?: number;
            /**
             * @description Time between two decisions of the rule. Usual: 0.02 to 1. Source: common practice, no source. Unit: s.
             * @default 1
             */
            controlPeriod?: number;
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "temperature-compensated-voltage";
            /** @description Voltage held at a cell temperature of 25 degC, per module in series. Default: maximum power voltage of the module at standard test conditions. Source: common practice, no source. Unit: V. */
            setVoltagePerModule?: number;
            /**
             * @description Step of the array voltage at each decision; 0 holds the target exactly, more makes the voltage hunt. Usual: 0 to 0.02. Source: common practice, no source. Unit: 1, of the open-circuit voltage at standard test conditions.
             * @default 0
             */
            stepFraction?: number;
        };
        /** @description The generator of EN 50530:2010 Annex C and IEC 62891:2020 Annex A. */
        TestGeneratorModule: {
            /**
             * @description discriminator enum property added by openapi-typescript
             * @enum {string}
             */
            kind: "test-generator";
            /** @description Nominal maximum power at standard test conditions. Unit: W. */
            maximumPower: number;
            /** @description Nominal voltage at maximum power. Unit: V. */
            maximumPowerVoltage: number;
            /**
             * @description Which of the standard's constants hold.
             * @enum {string}
             */
            technology: "crystalline-silicon" | "thin-film";
        };
        /** @description Null where none were asked for. */
        Traces: {
            lostByCause?: components["schemas"]["CauseTrace"];
            maximumPower?: components["schemas"]["PointTrace"];
            operating?: components["schemas"]["PointTrace"];
            /** @description Start of the first sample, ISO 8601, as it was sent. */
            start: string;
            /** @description Time from one sample to the next. Unit: s. */
            step: number;
        } | null;
        /** @description One site's own optimum and what the common setting costs it. */
        TunedSite: {
            atCommon: components["schemas"]["LossAt"] & unknown;
            /** @description What the site's array could have given. Unit: kWh. */
            available: number;
            id: string;
            optimum: components["schemas"]["LossAt"] & unknown;
            /** @description Lost by the common setting beyond the site's own. Unit: kWh. */
            regret: number;
        };
        /** @description The best setting, the loss around it, and each site's own. */
        TuningAnswer: {
            /** @description The loss over the range. */
            curve: (components["schemas"]["LossAt"] & unknown)[];
            flatRange: components["schemas"]["FlatRange"];
            mode: string;
            optimum: components["schemas"]["LossAt"] & unknown;
            parameter: string;
            provenance: components["schemas"]["Provenance"];
            sites: components["schemas"]["TunedSite"][];
            today: components["schemas"]["LossAt"];
            /** @description Of the setting. */
            unit: string;
        };
        /** @description A rule's setting that is to lose least. */
        TuningRequest: {
            array?: components["schemas"]["ArrayLayout"];
            climate?: components["schemas"]["Climate"];
            converter?: components["schemas"]["Converter"];
            /**
             * @description steady: each sample at rest. stepped: every rule at its own control period. auto: stepped up to a step of 300 s, steady above; the answer says which and why.
             * @default auto
             * @enum {string}
             */
            mode?: "auto" | "steady" | "stepped";
            module?: components["schemas"]["Module"];
            /**
             * @description The rule's numeric setting to tune.
             * @example fraction
             */
            parameter: string;
            /**
             * @description Points of the loss curve. Unit: 1.
             * @default 41
             */
            points?: number;
            /**
             * @description Null: half as wide again as what is usual for the setting.
             * @default null
             */
            range?: {
                /** @description Lowest value tried. Unit: that of the setting. */
                from: number;
                /** @description Highest value tried. Unit: that of the setting. */
                to: number;
            } | null;
            rule: components["schemas"]["Rule"];
            /** @description Up to 100 sites that share one setting; left out, the request itself is the one site. */
            sites?: components["schemas"]["TuningSite"][];
        };
        /** @description One site; what it leaves out it has from the request. */
        TuningSite: {
            array?: components["schemas"]["ArrayLayout"];
            climate?: components["schemas"]["Climate"];
            converter?: components["schemas"]["Converter"];
            /**
             * @description Name of the site in the answer.
             * @example Heron Bank
             */
            id: string;
            module?: components["schemas"]["Module"];
        };
        /** @description What is usual in the field. */
        UsualRange: {
            /** @description Lower end. Unit: that of the parameter. */
            from: number;
            /** @description Upper end. Unit: that of the parameter. */
            to: number;
        } | null;
        /** @description Which service this is and what it admits. */
        VersionAnswer: {
            limits: components["schemas"]["LimitsInForce"];
            name: string;
            /** @description Of the service. */
            version: string;
        };
    };
    responses: never;
    parameters: {
        /** @description An id of the caller's for log and answer; one that does not match the pattern is replaced. */
        RequestId: string;
    };
    requestBodies: never;
    headers: {
        /** @description The methods that fit this path. */
        Allow: string;
        /** @description Finds the request in the service's log. */
        RequestId: string;
        /** @description Seconds after which a retry makes sense. */
        RetryAfter: string;
        /** @description How a key is shown: Bearer. */
        WwwAuthenticate: string;
    };
    pathItems: never;
}
export type AmbientTemperature = components['schemas']['AmbientTemperature'];
export type ArrayLayout = components['schemas']['ArrayLayout'];
export type BatteryCoupledRule = components['schemas']['BatteryCoupledRule'];
export type Candidate = components['schemas']['Candidate'];
export type CauseTrace = components['schemas']['CauseTrace'];
export type Caution = components['schemas']['Caution'];
export type CellTemperature = components['schemas']['CellTemperature'];
export type CellTemperatureModel = components['schemas']['CellTemperatureModel'];
export type Circuit = components['schemas']['Circuit'];
export type Climate = components['schemas']['Climate'];
export type ComparedCandidate = components['schemas']['ComparedCandidate'];
export type ComparisonAnswer = components['schemas']['ComparisonAnswer'];
export type ComparisonRequest = components['schemas']['ComparisonRequest'];
export type ConstantVoltageRule = components['schemas']['ConstantVoltageRule'];
export type Converter = components['schemas']['Converter'];
export type Coverage = components['schemas']['Coverage'];
export type CurveAnswer = components['schemas']['CurveAnswer'];
export type CurvePoint = components['schemas']['CurvePoint'];
export type CurveRequest = components['schemas']['CurveRequest'];
export type DatasheetModule = components['schemas']['DatasheetModule'];
export type EfficiencyLevel = components['schemas']['EfficiencyLevel'];
export type EfficiencyRow = components['schemas']['EfficiencyRow'];
export type EfficiencyTestAnswer = components['schemas']['EfficiencyTestAnswer'];
export type EfficiencyTestRequest = components['schemas']['EfficiencyTestRequest'];
export type Energy = components['schemas']['Energy'];
export type EnergyValue = components['schemas']['EnergyValue'];
export type EstimateAnswer = components['schemas']['EstimateAnswer'];
export type EstimateRequest = components['schemas']['EstimateRequest'];
export type FaimanModel = components['schemas']['FaimanModel'];
export type FlatRange = components['schemas']['FlatRange'];
export type FractionalOpenCircuitVoltageRule = components['schemas']['FractionalOpenCircuitVoltageRule'];
export type Health = components['schemas']['Health'];
export type HorizontalIrradiance = components['schemas']['HorizontalIrradiance'];
export type IncrementalConductanceRule = components['schemas']['IncrementalConductanceRule'];
export type InterpolateGaps = components['schemas']['InterpolateGaps'];
export type Irradiance = components['schemas']['Irradiance'];
export type IrradianceClass = components['schemas']['IrradianceClass'];
export type KingModel = components['schemas']['KingModel'];
export type LimitsInForce = components['schemas']['LimitsInForce'];
export type LossAt = components['schemas']['LossAt'];
export type LostByCause = components['schemas']['LostByCause'];
export type LostPowerByCause = components['schemas']['LostPowerByCause'];
export type LostShareByCause = components['schemas']['LostShareByCause'];
export type MeasuredCircuit = components['schemas']['MeasuredCircuit'];
export type MeasuredCurve = components['schemas']['MeasuredCurve'];
export type Misfits = components['schemas']['Misfits'];
export type Model = components['schemas']['Model'];
export type Module = components['schemas']['Module'];
export type ModuleAnswer = components['schemas']['ModuleAnswer'];
export type ModuleFitAnswer = components['schemas']['ModuleFitAnswer'];
export type ModuleFitRequest = components['schemas']['ModuleFitRequest'];
export type ModuleToFit = components['schemas']['ModuleToFit'];
export type Month = components['schemas']['Month'];
export type NamedClimate = components['schemas']['NamedClimate'];
export type NoctModel = components['schemas']['NoctModel'];
export type PerfectRule = components['schemas']['PerfectRule'];
export type PerturbAndObserveRule = components['schemas']['PerturbAndObserveRule'];
export type PlaneOfArrayIrradiance = components['schemas']['PlaneOfArrayIrradiance'];
export type PointTrace = components['schemas']['PointTrace'];
export type PortfolioAborted = components['schemas']['PortfolioAborted'];
export type PortfolioCandidate = components['schemas']['PortfolioCandidate'];
export type PortfolioClimate = components['schemas']['PortfolioClimate'];
export type PortfolioDefaults = components['schemas']['PortfolioDefaults'];
export type PortfolioGroupTotals = components['schemas']['PortfolioGroupTotals'];
export type PortfolioInputLine = components['schemas']['PortfolioInputLine'];
export type PortfolioLabelTotals = components['schemas']['PortfolioLabelTotals'];
export type PortfolioOutputLine = components['schemas']['PortfolioOutputLine'];
export type PortfolioResult = components['schemas']['PortfolioResult'];
export type PortfolioSite = components['schemas']['PortfolioSite'];
export type PortfolioSiteProblem = components['schemas']['PortfolioSiteProblem'];
export type PortfolioTotals = components['schemas']['PortfolioTotals'];
export type PortfolioWorstSite = components['schemas']['PortfolioWorstSite'];
export type PowerCurveScanRule = components['schemas']['PowerCurveScanRule'];
export type Problem = components['schemas']['Problem'];
export type ProblemError = components['schemas']['ProblemError'];
export type Provenance = components['schemas']['Provenance'];
export type ResolvedArrayLayout = components['schemas']['ResolvedArrayLayout'];
export type ResolvedBatteryCoupledRule = components['schemas']['ResolvedBatteryCoupledRule'];
export type ResolvedCandidate = components['schemas']['ResolvedCandidate'];
export type ResolvedComparison = components['schemas']['ResolvedComparison'];
export type ResolvedConstantVoltageRule = components['schemas']['ResolvedConstantVoltageRule'];
export type ResolvedConverter = components['schemas']['ResolvedConverter'];
export type ResolvedEfficiencyTest = components['schemas']['ResolvedEfficiencyTest'];
export type ResolvedEnergyValue = components['schemas']['ResolvedEnergyValue'];
export type ResolvedEstimate = components['schemas']['ResolvedEstimate'];
export type ResolvedFractionalOpenCircuitVoltageRule = components['schemas']['ResolvedFractionalOpenCircuitVoltageRule'];
export type ResolvedIncrementalConductanceRule = components['schemas']['ResolvedIncrementalConductanceRule'];
export type ResolvedPerfectRule = components['schemas']['ResolvedPerfectRule'];
export type ResolvedPerturbAndObserveRule = components['schemas']['ResolvedPerturbAndObserveRule'];
export type ResolvedPowerCurveScanRule = components['schemas']['ResolvedPowerCurveScanRule'];
export type ResolvedRule = components['schemas']['ResolvedRule'];
export type ResolvedSensorError = components['schemas']['ResolvedSensorError'];
export type ResolvedSensorResolution = components['schemas']['ResolvedSensorResolution'];
export type ResolvedShortCurrentPulseRule = components['schemas']['ResolvedShortCurrentPulseRule'];
export type ResolvedTemperatureCompensatedVoltageRule = components['schemas']['ResolvedTemperatureCompensatedVoltageRule'];
export type RowTrace = components['schemas']['RowTrace'];
export type Rule = components['schemas']['Rule'];
export type RuleCatalogue = components['schemas']['RuleCatalogue'];
export type RuleDescription = components['schemas']['RuleDescription'];
export type RuleParameter = components['schemas']['RuleParameter'];
export type RulePlace = components['schemas']['RulePlace'];
export type SensorError = components['schemas']['SensorError'];
export type SensorResolution = components['schemas']['SensorResolution'];
export type ShortCurrentPulseRule = components['schemas']['ShortCurrentPulseRule'];
export type SingleDiodeModule = components['schemas']['SingleDiodeModule'];
export type Site = components['schemas']['Site'];
export type StandardPoint = components['schemas']['StandardPoint'];
export type Temperature = components['schemas']['Temperature'];
export type TemperatureCompensatedVoltageRule = components['schemas']['TemperatureCompensatedVoltageRule'];
export type TestGeneratorModule = components['schemas']['TestGeneratorModule'];
export type Traces = components['schemas']['Traces'];
export type TunedSite = components['schemas']['TunedSite'];
export type TuningAnswer = components['schemas']['TuningAnswer'];
export type TuningRequest = components['schemas']['TuningRequest'];
export type TuningSite = components['schemas']['TuningSite'];
export type UsualRange = components['schemas']['UsualRange'];
export type VersionAnswer = components['schemas']['VersionAnswer'];
export type ParameterRequestId = components['parameters']['RequestId'];
export type HeaderAllow = components['headers']['Allow'];
export type HeaderRequestId = components['headers']['RequestId'];
export type HeaderRetryAfter = components['headers']['RetryAfter'];
export type HeaderWwwAuthenticate = components['headers']['WwwAuthenticate'];
export type $defs = Record<string, never>;
export interface operations {
    liveness: {
        parameters: {
            query?: never;
            header?: {
                /** @description An id of the caller's for log and answer; one that does not match the pattern is replaced. */
                "x-request-id"?: components["parameters"]["RequestId"];
            };
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description It is. */
            200: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    /**
                     * @example {
                     *       "status": "live"
                     *     }
                     */
                    "application/json": components["schemas"]["Health"];
                };
            };
            /** @description `malformed-request`: The HTTP parser could not read the request. */
            400: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `method-not-allowed`: The Allow header names those that do. */
            405: {
                headers: {
                    allow: components["headers"]["Allow"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `not-acceptable`: The Accept header rules out application/json, or application/x-ndjson for a portfolio. */
            406: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `headers-too-large`: Request line and headers exceed 16 KiB. */
            431: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `internal`: A defect of the service; the request id finds it in the log. */
            500: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
        };
    };
    readiness: {
        parameters: {
            query?: never;
            header?: {
                /** @description An id of the caller's for log and answer; one that does not match the pattern is replaced. */
                "x-request-id"?: components["parameters"]["RequestId"];
            };
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description They may. */
            200: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    /**
                     * @example {
                     *       "status": "ready"
                     *     }
                     */
                    "application/json": components["schemas"]["Health"];
                };
            };
            /** @description `malformed-request`: The HTTP parser could not read the request. */
            400: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `method-not-allowed`: The Allow header names those that do. */
            405: {
                headers: {
                    allow: components["headers"]["Allow"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `not-acceptable`: The Accept header rules out application/json, or application/x-ndjson for a portfolio. */
            406: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `headers-too-large`: Request line and headers exceed 16 KiB. */
            431: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `internal`: A defect of the service; the request id finds it in the log. */
            500: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `warming`: The workers are not warm yet. `draining`: Nothing was begun; another replica, or this one after its restart, will answer. */
            503: {
                headers: {
                    "retry-after": components["headers"]["RetryAfter"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
        };
    };
    document: {
        parameters: {
            query?: never;
            header?: {
                /** @description An id of the caller's for log and answer; one that does not match the pattern is replaced. */
                "x-request-id"?: components["parameters"]["RequestId"];
            };
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description This document. */
            200: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": Record<string, never>;
                };
            };
            /** @description `malformed-request`: The HTTP parser could not read the request. */
            400: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `method-not-allowed`: The Allow header names those that do. */
            405: {
                headers: {
                    allow: components["headers"]["Allow"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `not-acceptable`: The Accept header rules out application/json, or application/x-ndjson for a portfolio. */
            406: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `headers-too-large`: Request line and headers exceed 16 KiB. */
            431: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `internal`: A defect of the service; the request id finds it in the log. */
            500: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
        };
    };
    compare: {
        parameters: {
            query?: never;
            header?: {
                /** @description An id of the caller's for log and answer; one that does not match the pattern is replaced. */
                "x-request-id"?: components["parameters"]["RequestId"];
            };
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                /**
                 * @example {
                 *       "module": {
                 *         "kind": "datasheet",
                 *         "cellsInSeries": 60,
                 *         "shortCircuitCurrent": 9.91,
                 *         "openCircuitVoltage": 38.9,
                 *         "maximumPowerCurrent": 9.36,
                 *         "maximumPowerVoltage": 31.8,
                 *         "shortCircuitCurrentCoefficient": 0.05,
                 *         "openCircuitVoltageCoefficient": -0.29
                 *       },
                 *       "array": {
                 *         "modulesInSeries": 2
                 *       },
                 *       "candidates": [
                 *         {
                 *           "label": "one voltage",
                 *           "rule": {
                 *             "kind": "constant-voltage",
                 *             "setVoltagePerModule": 29
                 *           },
                 *           "price": 120
                 *         },
                 *         {
                 *           "label": "climbs",
                 *           "rule": {
                 *             "kind": "perturb-and-observe",
                 *             "stepFraction": 0.005
                 *           },
                 *           "price": 180
                 *         }
                 *       ],
                 *       "baseline": "one voltage",
                 *       "climate": {
                 *         "start": "2025-04-12T00:00:00+02:00",
                 *         "step": 10800,
                 *         "irradiance": {
                 *           "kind": "plane-of-array",
                 *           "values": [
                 *             0,
                 *             0,
                 *             120,
                 *             560,
                 *             810,
                 *             470,
                 *             60,
                 *             0
                 *           ]
                 *         },
                 *         "temperature": {
                 *           "kind": "ambient",
                 *           "values": [
                 *             4.1,
                 *             3.6,
                 *             7.2,
                 *             11.8,
                 *             14.9,
                 *             14.1,
                 *             9.3,
                 *             6
                 *           ]
                 *         }
                 *       },
                 *       "energyValue": {
                 *         "currency": "EUR",
                 *         "perKilowattHour": 0.24
                 *       }
                 *     }
                 */
                "application/json": components["schemas"]["ComparisonRequest"];
            };
        };
        responses: {
            /** @description One result a candidate, in the order of the request. */
            200: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    /**
                     * @example {
                     *       "resolved": {
                     *         "array": {
                     *           "modulesInSeries": 2,
                     *           "stringsInParallel": 1,
                     *           "wiringResistance": 0
                     *         },
                     *         "candidates": [
                     *           {
                     *             "label": "one voltage",
                     *             "rule": {
                     *               "kind": "constant-voltage",
                     *               "setVoltagePerModule": 29,
                     *               "controlPeriod": 1,
                     *               "stepFraction": 0
                     *             },
                     *             "converter": {
                     *               "trackingMinimumVoltage": 0,
                     *               "trackingMaximumVoltage": null,
                     *               "inputVoltageRating": null,
                     *               "maximumPower": null,
                     *               "maximumCurrent": null,
                     *               "wakePower": 0,
                     *               "rippleAmplitude": 0,
                     *               "sensorError": {
                     *                 "voltageGain": 0,
                     *                 "voltageOffset": 0,
                     *                 "currentGain": 0,
                     *                 "currentOffset": 0
                     *               },
                     *               "resolution": {
                     *                 "voltage": 0,
                     *                 "current": 0
                     *               }
                     *             },
                     *             "price": 120
                     *           },
                     *           {
                     *             "label": "climbs",
                     *             "rule": {
                     *               "kind": "perturb-and-observe",
                     *               "controlPeriod": 0.1,
                     *               "stepFraction": 0.005
                     *             },
                     *             "converter": {
                     *               "trackingMinimumVoltage": 0,
                     *               "trackingMaximumVoltage": null,
                     *               "inputVoltageRating": null,
                     *               "maximumPower": null,
                     *               "maximumCurrent": null,
                     *               "wakePower": 0,
                     *               "rippleAmplitude": 0,
                     *               "sensorError": {
                     *                 "voltageGain": 0,
                     *                 "voltageOffset": 0,
                     *                 "currentGain": 0,
                     *                 "currentOffset": 0
                     *               },
                     *               "resolution": {
                     *                 "voltage": 0,
                     *                 "current": 0
                     *               }
                     *             },
                     *             "price": 180
                     *           }
                     *         ],
                     *         "baseline": "one voltage",
                     *         "energyValue": {
                     *           "currency": "EUR",
                     *           "perKilowattHour": 0.24
                     *         },
                     *         "mode": "steady",
                     *         "modeReason": "a step of 10800 s is longer than 300 s"
                     *       },
                     *       "results": [
                     *         {
                     *           "label": "one voltage",
                     *           "rank": 2,
                     *           "energy": {
                     *             "available": 3.53694,
                     *             "delivered": 3.41718,
                     *             "lost": 0.119763,
                     *             "clipped": 0,
                     *             "lostFraction": 0.0338605,
                     *             "trackingEfficiency": 0.96614,
                     *             "insolation": 6.06
                     *           },
                     *           "lostByCause": {
                     *             "voltageWindow": 0,
                     *             "wrongPeak": 0,
                     *             "setPoint": 0.119763,
                     *             "heldSample": 0,
                     *             "regulation": 0,
                     *             "interruption": 0
                     *           },
                     *           "differenceToBaseline": 0,
                     *           "differenceToBest": -0.118926,
                     *           "worthPerYear": null,
                     *           "worthReason": "the climate lasts 1 days, not 365 or 366",
                     *           "payback": null
                     *         },
                     *         {
                     *           "label": "climbs",
                     *           "rank": 1,
                     *           "energy": {
                     *             "available": 3.53694,
                     *             "delivered": 3.53611,
                     *             "lost": 0.000836952,
                     *             "clipped": 0,
                     *             "lostFraction": 0.000236631,
                     *             "trackingEfficiency": 0.999763,
                     *             "insolation": 6.06
                     *           },
                     *           "lostByCause": {
                     *             "voltageWindow": 0,
                     *             "wrongPeak": 0,
                     *             "setPoint": 0,
                     *             "heldSample": 0,
                     *             "regulation": 0.000836952,
                     *             "interruption": 0
                     *           },
                     *           "differenceToBaseline": 0.118926,
                     *           "differenceToBest": 0,
                     *           "worthPerYear": null,
                     *           "worthReason": "the climate lasts 1 days, not 365 or 366",
                     *           "payback": null
                     *         }
                     *       ],
                     *       "coverage": {
                     *         "samples": 8,
                     *         "used": 8,
                     *         "skipped": 0
                     *       },
                     *       "module": {
                     *         "fit": "exact",
                     *         "circuit": {
                     *           "kind": "single-diode",
                     *           "cellsInSeries": 60,
                     *           "photocurrent": 9.91785,
                     *           "saturationCurrent": 2.22059e-11,
                     *           "seriesResistance": 0.284981,
                     *           "shuntResistance": 359.887,
                     *           "idealityVoltage": 1.45073,
                     *           "photocurrentCoefficient": 0.0499604,
                     *           "bandgap": 1.121,
                     *           "bandgapCoefficient": -0.0002677
                     *         },
                     *         "misfits": {
                     *           "shortCircuitCurrent": 0,
                     *           "openCircuitVoltage": 0,
                     *           "maximumPowerCurrent": 0,
                     *           "maximumPowerSlope": 0,
                     *           "openCircuitVoltageCoefficient": 0
                     *         }
                     *       },
                     *       "cautions": [
                     *         {
                     *           "code": "cold-voltage-not-checked",
                     *           "severity": "warning",
                     *           "detail": "No inputVoltageRating was given, so the open-circuit voltage of 85.6 V at 3.6 degC was not checked against it.",
                     *           "values": {
                     *             "temperature": 3.6,
                     *             "openCircuitVoltage": 85.58,
                     *             "moduleByCircuit": 41.2991,
                     *             "moduleByCoefficient": 41.3141,
                     *             "moduleByFactorTable": 42.79
                     *           }
                     *         },
                     *         {
                     *           "code": "series-cold-is-not-record-cold",
                     *           "severity": "info",
                     *           "detail": "The coldest temperature of the series, 3.6 degC, was taken; the site's record low is likely colder. Give recordLowTemperature.",
                     *           "values": {
                     *             "temperature": 3.6
                     *           }
                     *         },
                     *         {
                     *           "code": "wind-assumed",
                     *           "severity": "info",
                     *           "detail": "No wind speed was given: 1 m/s was taken throughout for the cell temperature.",
                     *           "values": {
                     *             "windSpeed": 1
                     *           }
                     *         },
                     *         {
                     *           "code": "planning-estimate",
                     *           "severity": "info",
                     *           "detail": "Estimates for planning, not an electrical design. Photovoltaic strings are a shock, arc and fire hazard and cannot be switched off in daylight. Local codes and a licensed designer decide.",
                     *           "values": {}
                     *         }
                     *       ],
                     *       "provenance": {
                     *         "version": "0.1.0",
                     *         "models": [
                     *           {
                     *             "name": "datasheet-fit",
                     *             "version": "1",
                     *             "source": "De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88 (from memory), its five conditions"
                     *           },
                     *           {
                     *             "name": "single-diode",
                     *             "version": "1",
                     *             "source": "De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88 (from memory), its translation to irradiance and temperature"
                     *           },
                     *           {
                     *             "name": "cell-temperature-faiman",
                     *             "version": "1",
                     *             "source": "Faiman, Prog. Photovolt. 16 (2008) 307-315"
                     *           },
                     *           {
                     *             "name": "constant-voltage",
                     *             "version": "1",
                     *             "source": "Esram & Chapman, IEEE Trans. Energy Convers. 22(2) (2007) 439-449 (from memory)"
                     *           },
                     *           {
                     *             "name": "perturb-and-observe",
                     *             "version": "1",
                     *             "source": "Femia, Petrone, Spagnuolo & Vitelli, IEEE Trans. Power Electron. 20(4) (2005) 963-973 (from memory)"
                     *           },
                     *           {
                     *             "name": "steady-tracking",
                     *             "version": "1",
                     *             "source": "own derivation: each sample at rest, the causes telescoping from available to delivered power"
                     *           }
                     *         ],
                     *         "inputDigest": "f52bde3c748759fa1547278c632b047692d4c37fa12737c6b8b787dd202226c0"
                     *       }
                     *     }
                     */
                    "application/json": components["schemas"]["ComparisonAnswer"];
                };
            };
            /** @description `malformed-request`: The HTTP parser could not read the request. `malformed-body`: Not UTF-8, not JSON, nested too deep, or not gzip. */
            400: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unauthorized`: No key, or none that is known. */
            401: {
                headers: {
                    "www-authenticate": components["headers"]["WwwAuthenticate"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `method-not-allowed`: The Allow header names those that do. */
            405: {
                headers: {
                    allow: components["headers"]["Allow"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `not-acceptable`: The Accept header rules out application/json, or application/x-ndjson for a portfolio. */
            406: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `too-slow`: No byte of it arrived for a while, or it took too long as a whole. */
            408: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `body-too-large`: Above the limit of at most 67108864 bytes, or of 16777216 for a line of a portfolio, decompressed. */
            413: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unsupported-media-type`: The body must be application/json in UTF-8, or application/x-ndjson for a portfolio, plain or gzip. */
            415: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `invalid-request`: Schema, relations or physics; every error says where and what would be right. `too-much-work`: Refused before starting, with the estimate and the limit. `time-limit-exceeded`: Stopped at the limit of computing time; the same request would end the same. */
            422: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `headers-too-large`: Request line and headers exceed 16 KiB. */
            431: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `internal`: A defect of the service; the request id finds it in the log. `worker-lost`: The worker died or ran out of memory with this request; do not simply retry. */
            500: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `overloaded`: The queue is full; nothing was begun. Retry after the time that Retry-After says. `draining`: Nothing was begun; another replica, or this one after its restart, will answer. */
            503: {
                headers: {
                    "retry-after": components["headers"]["RetryAfter"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
        };
    };
    curve: {
        parameters: {
            query?: never;
            header?: {
                /** @description An id of the caller's for log and answer; one that does not match the pattern is replaced. */
                "x-request-id"?: components["parameters"]["RequestId"];
            };
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                /**
                 * @example {
                 *       "module": {
                 *         "kind": "datasheet",
                 *         "cellsInSeries": 60,
                 *         "shortCircuitCurrent": 9.91,
                 *         "openCircuitVoltage": 38.9,
                 *         "maximumPowerCurrent": 9.36,
                 *         "maximumPowerVoltage": 31.8,
                 *         "shortCircuitCurrentCoefficient": 0.05,
                 *         "openCircuitVoltageCoefficient": -0.29
                 *       },
                 *       "irradiance": 800,
                 *       "cellTemperature": 45,
                 *       "points": 9,
                 *       "rules": [
                 *         {
                 *           "kind": "constant-voltage"
                 *         },
                 *         {
                 *           "kind": "short-current-pulse"
                 *         }
                 *       ]
                 *     }
                 */
                "application/json": components["schemas"]["CurveRequest"];
            };
        };
        responses: {
            /** @description The curve, its peaks, and the place of each rule. */
            200: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    /**
                     * @example {
                     *       "voltage": [
                     *         0,
                     *         4.53678,
                     *         9.07356,
                     *         13.6103,
                     *         18.1471,
                     *         22.6839,
                     *         27.2207,
                     *         31.7575,
                     *         36.2943
                     *       ],
                     *       "current": [
                     *         8.00848,
                     *         7.99841,
                     *         7.98833,
                     *         7.97823,
                     *         7.96789,
                     *         7.95288,
                     *         7.8522,
                     *         6.53031,
                     *         0
                     *       ],
                     *       "power": [
                     *         0,
                     *         36.287,
                     *         72.4826,
                     *         108.587,
                     *         144.594,
                     *         180.402,
                     *         213.742,
                     *         207.386,
                     *         0
                     *       ],
                     *       "peaks": [
                     *         {
                     *           "voltage": 29.6039,
                     *           "current": 7.52236,
                     *           "power": 222.691
                     *         }
                     *       ],
                     *       "shortCircuitCurrent": 8.00848,
                     *       "openCircuitVoltage": 36.2943,
                     *       "places": [
                     *         {
                     *           "rule": {
                     *             "kind": "constant-voltage",
                     *             "setVoltagePerModule": 31.8,
                     *             "controlPeriod": 1,
                     *             "stepFraction": 0
                     *           },
                     *           "voltage": 31.8,
                     *           "current": 6.49926,
                     *           "power": 206.676,
                     *           "lost": 16.0146,
                     *           "lostByCause": {
                     *             "voltageWindow": 0,
                     *             "wrongPeak": 0,
                     *             "setPoint": 16.0146,
                     *             "heldSample": 0,
                     *             "regulation": 0,
                     *             "interruption": 0
                     *           }
                     *         },
                     *         {
                     *           "rule": {
                     *             "kind": "short-current-pulse",
                     *             "fraction": 0.92,
                     *             "samplePeriod": 16,
                     *             "sampleDuration": 0.032,
                     *             "pilotCell": false,
                     *             "controlPeriod": 1,
                     *             "stepFraction": 0
                     *           },
                     *           "voltage": 30.1295,
                     *           "current": 7.35307,
                     *           "power": 221.544,
                     *           "lost": 1.14681,
                     *           "lostByCause": {
                     *             "voltageWindow": 0,
                     *             "wrongPeak": 0,
                     *             "setPoint": 0.702832,
                     *             "heldSample": 0,
                     *             "regulation": 0,
                     *             "interruption": 0.443976
                     *           }
                     *         }
                     *       ],
                     *       "module": {
                     *         "fit": "exact",
                     *         "circuit": {
                     *           "kind": "single-diode",
                     *           "cellsInSeries": 60,
                     *           "photocurrent": 9.91785,
                     *           "saturationCurrent": 2.22059e-11,
                     *           "seriesResistance": 0.284981,
                     *           "shuntResistance": 359.887,
                     *           "idealityVoltage": 1.45073,
                     *           "photocurrentCoefficient": 0.0499604,
                     *           "bandgap": 1.121,
                     *           "bandgapCoefficient": -0.0002677
                     *         },
                     *         "misfits": {
                     *           "shortCircuitCurrent": 0,
                     *           "openCircuitVoltage": 0,
                     *           "maximumPowerCurrent": 0,
                     *           "maximumPowerSlope": 0,
                     *           "openCircuitVoltageCoefficient": 0
                     *         }
                     *       },
                     *       "provenance": {
                     *         "version": "0.1.0",
                     *         "models": [
                     *           {
                     *             "name": "datasheet-fit",
                     *             "version": "1",
                     *             "source": "De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88 (from memory), its five conditions"
                     *           },
                     *           {
                     *             "name": "single-diode",
                     *             "version": "1",
                     *             "source": "De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88 (from memory), its translation to irradiance and temperature"
                     *           },
                     *           {
                     *             "name": "constant-voltage",
                     *             "version": "1",
                     *             "source": "Esram & Chapman, IEEE Trans. Energy Convers. 22(2) (2007) 439-449 (from memory)"
                     *           },
                     *           {
                     *             "name": "short-current-pulse",
                     *             "version": "1",
                     *             "source": "Noguchi, Togashi & Nakamoto, IEEE Trans. Ind. Electron. 49(1) (2002) 217-223 (fraction .92; from memory); Esram & Chapman, IEEE Trans. Energy Convers. 22(2) (2007) 439-449 (.78 to .92; from memory)"
                     *           }
                     *         ],
                     *         "inputDigest": "1152abdc7dfb915ce71add1873d1287103c080b07c23ba8d48fcf9450f33f0c5"
                     *       }
                     *     }
                     */
                    "application/json": components["schemas"]["CurveAnswer"];
                };
            };
            /** @description `malformed-request`: The HTTP parser could not read the request. `malformed-body`: Not UTF-8, not JSON, nested too deep, or not gzip. */
            400: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unauthorized`: No key, or none that is known. */
            401: {
                headers: {
                    "www-authenticate": components["headers"]["WwwAuthenticate"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `method-not-allowed`: The Allow header names those that do. */
            405: {
                headers: {
                    allow: components["headers"]["Allow"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `not-acceptable`: The Accept header rules out application/json, or application/x-ndjson for a portfolio. */
            406: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `too-slow`: No byte of it arrived for a while, or it took too long as a whole. */
            408: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `body-too-large`: Above the limit of at most 67108864 bytes, or of 16777216 for a line of a portfolio, decompressed. */
            413: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unsupported-media-type`: The body must be application/json in UTF-8, or application/x-ndjson for a portfolio, plain or gzip. */
            415: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `invalid-request`: Schema, relations or physics; every error says where and what would be right. `too-much-work`: Refused before starting, with the estimate and the limit. `time-limit-exceeded`: Stopped at the limit of computing time; the same request would end the same. */
            422: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `headers-too-large`: Request line and headers exceed 16 KiB. */
            431: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `internal`: A defect of the service; the request id finds it in the log. `worker-lost`: The worker died or ran out of memory with this request; do not simply retry. */
            500: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `overloaded`: The queue is full; nothing was begun. Retry after the time that Retry-After says. `draining`: Nothing was begun; another replica, or this one after its restart, will answer. */
            503: {
                headers: {
                    "retry-after": components["headers"]["RetryAfter"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
        };
    };
    testEfficiency: {
        parameters: {
            query?: never;
            header?: {
                /** @description An id of the caller's for log and answer; one that does not match the pattern is replaced. */
                "x-request-id"?: components["parameters"]["RequestId"];
            };
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                /**
                 * @example {
                 *       "module": {
                 *         "kind": "test-generator",
                 *         "technology": "crystalline-silicon",
                 *         "maximumPower": 1000,
                 *         "maximumPowerVoltage": 100
                 *       },
                 *       "rule": {
                 *         "kind": "fractional-open-circuit-voltage",
                 *         "fraction": 0.8
                 *       },
                 *       "test": "static"
                 *     }
                 */
                "application/json": components["schemas"]["EfficiencyTestRequest"];
            };
        };
        responses: {
            /** @description Rows or levels with their efficiencies. */
            200: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    /**
                     * @example {
                     *       "test": "static",
                     *       "edition": "EN 50530:2010 (sequences from memory)",
                     *       "resolved": {
                     *         "rule": {
                     *           "kind": "fractional-open-circuit-voltage",
                     *           "fraction": 0.8,
                     *           "samplePeriod": 16,
                     *           "sampleDuration": 0.256,
                     *           "pilotCell": false,
                     *           "controlPeriod": 1,
                     *           "stepFraction": 0
                     *         },
                     *         "converter": {
                     *           "trackingMinimumVoltage": 0,
                     *           "trackingMaximumVoltage": null,
                     *           "inputVoltageRating": null,
                     *           "maximumPower": null,
                     *           "maximumCurrent": null,
                     *           "wakePower": 0,
                     *           "rippleAmplitude": 0,
                     *           "sensorError": {
                     *             "voltageGain": 0,
                     *             "voltageOffset": 0,
                     *             "currentGain": 0,
                     *             "currentOffset": 0
                     *           },
                     *           "resolution": {
                     *             "voltage": 0,
                     *             "current": 0
                     *           }
                     *         }
                     *       },
                     *       "rows": null,
                     *       "levels": [
                     *         {
                     *           "level": 0.05,
                     *           "irradiance": 58.2701,
                     *           "efficiency": 0.983976,
                     *           "lostByCause": {
                     *             "voltageWindow": 0,
                     *             "wrongPeak": 0,
                     *             "setPoint": 0.000023966,
                     *             "heldSample": 0,
                     *             "regulation": 0,
                     *             "interruption": 0.0159996
                     *           }
                     *         },
                     *         {
                     *           "level": 0.1,
                     *           "irradiance": 110.225,
                     *           "efficiency": 0.983976,
                     *           "lostByCause": {
                     *             "voltageWindow": 0,
                     *             "wrongPeak": 0,
                     *             "setPoint": 0.000023966,
                     *             "heldSample": 0,
                     *             "regulation": 0,
                     *             "interruption": 0.0159996
                     *           }
                     *         },
                     *         {
                     *           "level": 0.2,
                     *           "irradiance": 210.119,
                     *           "efficiency": 0.983976,
                     *           "lostByCause": {
                     *             "voltageWindow": 0,
                     *             "wrongPeak": 0,
                     *             "setPoint": 0.000023966,
                     *             "heldSample": 0,
                     *             "regulation": 0,
                     *             "interruption": 0.0159996
                     *           }
                     *         },
                     *         {
                     *           "level": 0.25,
                     *           "irradiance": 259.189,
                     *           "efficiency": 0.983976,
                     *           "lostByCause": {
                     *             "voltageWindow": 0,
                     *             "wrongPeak": 0,
                     *             "setPoint": 0.000023966,
                     *             "heldSample": 0,
                     *             "regulation": 0,
                     *             "interruption": 0.0159996
                     *           }
                     *         },
                     *         {
                     *           "level": 0.3,
                     *           "irradiance": 307.986,
                     *           "efficiency": 0.983976,
                     *           "lostByCause": {
                     *             "voltageWindow": 0,
                     *             "wrongPeak": 0,
                     *             "setPoint": 0.000023966,
                     *             "heldSample": 0,
                     *             "regulation": 0,
                     *             "interruption": 0.0159996
                     *           }
                     *         },
                     *         {
                     *           "level": 0.5,
                     *           "irradiance": 502.517,
                     *           "efficiency": 0.983976,
                     *           "lostByCause": {
                     *             "voltageWindow": 0,
                     *             "wrongPeak": 0,
                     *             "setPoint": 0.000023966,
                     *             "heldSample": 0,
                     *             "regulation": 0,
                     *             "interruption": 0.0159996
                     *           }
                     *         },
                     *         {
                     *           "level": 0.75,
                     *           "irradiance": 748.152,
                     *           "efficiency": 0.983976,
                     *           "lostByCause": {
                     *             "voltageWindow": 0,
                     *             "wrongPeak": 0,
                     *             "setPoint": 0.000023966,
                     *             "heldSample": 0,
                     *             "regulation": 0,
                     *             "interruption": 0.0159996
                     *           }
                     *         },
                     *         {
                     *           "level": 1,
                     *           "irradiance": 1000,
                     *           "efficiency": 0.983976,
                     *           "lostByCause": {
                     *             "voltageWindow": 0,
                     *             "wrongPeak": 0,
                     *             "setPoint": 0.000023966,
                     *             "heldSample": 0,
                     *             "regulation": 0,
                     *             "interruption": 0.0159996
                     *           }
                     *         }
                     *       ],
                     *       "efficiency": null,
                     *       "duration": null,
                     *       "europeanWeighted": 0.983976,
                     *       "cecWeighted": 0.983976,
                     *       "trace": null,
                     *       "module": {
                     *         "fit": "given",
                     *         "circuit": null,
                     *         "misfits": null
                     *       },
                     *       "provenance": {
                     *         "version": "0.1.0",
                     *         "models": [
                     *           {
                     *             "name": "test-generator",
                     *             "version": "1",
                     *             "source": "EN 50530:2010 Annex C; IEC 62891:2020 Annex A"
                     *           },
                     *           {
                     *             "name": "fractional-open-circuit-voltage",
                     *             "version": "1",
                     *             "source": "Enslin, Wolf, Snyman & Swiegers, IEEE Trans. Ind. Electron. 44(6) (1997) 769-773 (fraction .76; from memory); Esram & Chapman, IEEE Trans. Energy Convers. 22(2) (2007) 439-449 (.71 to .78; from memory)"
                     *           },
                     *           {
                     *             "name": "efficiency-test",
                     *             "version": "1",
                     *             "source": "EN 50530:2010 (sequences from memory)"
                     *           }
                     *         ],
                     *         "inputDigest": "f05868b56eb401ef73b2d569b23f4dc766822fa6163e0dc043f860bcd8a786d9"
                     *       }
                     *     }
                     */
                    "application/json": components["schemas"]["EfficiencyTestAnswer"];
                };
            };
            /** @description `malformed-request`: The HTTP parser could not read the request. `malformed-body`: Not UTF-8, not JSON, nested too deep, or not gzip. */
            400: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unauthorized`: No key, or none that is known. */
            401: {
                headers: {
                    "www-authenticate": components["headers"]["WwwAuthenticate"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `method-not-allowed`: The Allow header names those that do. */
            405: {
                headers: {
                    allow: components["headers"]["Allow"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `not-acceptable`: The Accept header rules out application/json, or application/x-ndjson for a portfolio. */
            406: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `too-slow`: No byte of it arrived for a while, or it took too long as a whole. */
            408: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `body-too-large`: Above the limit of at most 67108864 bytes, or of 16777216 for a line of a portfolio, decompressed. */
            413: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unsupported-media-type`: The body must be application/json in UTF-8, or application/x-ndjson for a portfolio, plain or gzip. */
            415: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `invalid-request`: Schema, relations or physics; every error says where and what would be right. `too-much-work`: Refused before starting, with the estimate and the limit. `time-limit-exceeded`: Stopped at the limit of computing time; the same request would end the same. */
            422: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `headers-too-large`: Request line and headers exceed 16 KiB. */
            431: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `internal`: A defect of the service; the request id finds it in the log. `worker-lost`: The worker died or ran out of memory with this request; do not simply retry. */
            500: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `overloaded`: The queue is full; nothing was begun. Retry after the time that Retry-After says. `draining`: Nothing was begun; another replica, or this one after its restart, will answer. */
            503: {
                headers: {
                    "retry-after": components["headers"]["RetryAfter"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
        };
    };
    estimate: {
        parameters: {
            query?: never;
            header?: {
                /** @description An id of the caller's for log and answer; one that does not match the pattern is replaced. */
                "x-request-id"?: components["parameters"]["RequestId"];
            };
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                /**
                 * @example {
                 *       "module": {
                 *         "kind": "datasheet",
                 *         "cellsInSeries": 60,
                 *         "shortCircuitCurrent": 9.91,
                 *         "openCircuitVoltage": 38.9,
                 *         "maximumPowerCurrent": 9.36,
                 *         "maximumPowerVoltage": 31.8,
                 *         "shortCircuitCurrentCoefficient": 0.05,
                 *         "openCircuitVoltageCoefficient": -0.29
                 *       },
                 *       "rule": {
                 *         "kind": "fractional-open-circuit-voltage"
                 *       },
                 *       "climate": {
                 *         "start": "2025-04-12T00:00:00+02:00",
                 *         "step": 10800,
                 *         "irradiance": {
                 *           "kind": "plane-of-array",
                 *           "values": [
                 *             0,
                 *             0,
                 *             120,
                 *             560,
                 *             810,
                 *             470,
                 *             60,
                 *             0
                 *           ]
                 *         },
                 *         "temperature": {
                 *           "kind": "ambient",
                 *           "values": [
                 *             4.1,
                 *             3.6,
                 *             7.2,
                 *             11.8,
                 *             14.9,
                 *             14.1,
                 *             9.3,
                 *             6
                 *           ]
                 *         }
                 *       }
                 *     }
                 */
                "application/json": components["schemas"]["EstimateRequest"];
            };
        };
        responses: {
            /** @description Energies, causes, months, irradiance classes, traces and cautions. */
            200: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    /**
                     * @example {
                     *       "resolved": {
                     *         "array": {
                     *           "modulesInSeries": 1,
                     *           "stringsInParallel": 1,
                     *           "wiringResistance": 0
                     *         },
                     *         "converter": {
                     *           "trackingMinimumVoltage": 0,
                     *           "trackingMaximumVoltage": null,
                     *           "inputVoltageRating": null,
                     *           "maximumPower": null,
                     *           "maximumCurrent": null,
                     *           "wakePower": 0,
                     *           "rippleAmplitude": 0,
                     *           "sensorError": {
                     *             "voltageGain": 0,
                     *             "voltageOffset": 0,
                     *             "currentGain": 0,
                     *             "currentOffset": 0
                     *           },
                     *           "resolution": {
                     *             "voltage": 0,
                     *             "current": 0
                     *           }
                     *         },
                     *         "rule": {
                     *           "kind": "fractional-open-circuit-voltage",
                     *           "fraction": 0.76,
                     *           "samplePeriod": 16,
                     *           "sampleDuration": 0.256,
                     *           "pilotCell": false,
                     *           "controlPeriod": 1,
                     *           "stepFraction": 0
                     *         },
                     *         "mode": "steady",
                     *         "modeReason": "a step of 10800 s is longer than 300 s"
                     *       },
                     *       "energy": {
                     *         "available": 1.76847,
                     *         "delivered": 1.64937,
                     *         "lost": 0.119098,
                     *         "clipped": 0,
                     *         "lostFraction": 0.0673451,
                     *         "trackingEfficiency": 0.932655,
                     *         "insolation": 6.06
                     *       },
                     *       "lostByCause": {
                     *         "voltageWindow": 0,
                     *         "wrongPeak": 0,
                     *         "setPoint": 0.0922788,
                     *         "heldSample": 0,
                     *         "regulation": 0,
                     *         "interruption": 0.0268191
                     *       },
                     *       "months": [
                     *         {
                     *           "month": "2025-04",
                     *           "available": 1.76847,
                     *           "delivered": 1.64937,
                     *           "lost": 0.119098,
                     *           "lostByCause": {
                     *             "voltageWindow": 0,
                     *             "wrongPeak": 0,
                     *             "setPoint": 0.0922788,
                     *             "heldSample": 0,
                     *             "regulation": 0,
                     *             "interruption": 0.0268191
                     *           }
                     *         }
                     *       ],
                     *       "irradianceClasses": [
                     *         {
                     *           "from": 0,
                     *           "to": 100,
                     *           "hours": 12,
                     *           "available": 0.0538844,
                     *           "lost": 0.00588872
                     *         },
                     *         {
                     *           "from": 100,
                     *           "to": 200,
                     *           "hours": 3,
                     *           "available": 0.110517,
                     *           "lost": 0.0119657
                     *         },
                     *         {
                     *           "from": 400,
                     *           "to": 500,
                     *           "hours": 3,
                     *           "available": 0.418174,
                     *           "lost": 0.0321277
                     *         },
                     *         {
                     *           "from": 500,
                     *           "to": 600,
                     *           "hours": 3,
                     *           "available": 0.497526,
                     *           "lost": 0.035468
                     *         },
                     *         {
                     *           "from": 800,
                     *           "to": 900,
                     *           "hours": 3,
                     *           "available": 0.68837,
                     *           "lost": 0.0336476
                     *         }
                     *       ],
                     *       "coverage": {
                     *         "samples": 8,
                     *         "used": 8,
                     *         "skipped": 0
                     *       },
                     *       "traces": {
                     *         "start": "2025-04-12T00:00:00+02:00",
                     *         "step": 10800,
                     *         "maximumPower": {
                     *           "voltage": [
                     *             0,
                     *             0,
                     *             32.793,
                     *             31.533,
                     *             30.149,
                     *             31.57,
                     *             31.992,
                     *             0
                     *           ],
                     *           "current": [
                     *             0,
                     *             0,
                     *             1.123,
                     *             5.259,
                     *             7.611,
                     *             4.415,
                     *             0.561,
                     *             0
                     *           ],
                     *           "power": [
                     *             0,
                     *             0,
                     *             36.839,
                     *             165.842,
                     *             229.457,
                     *             139.391,
                     *             17.961,
                     *             0
                     *           ]
                     *         },
                     *         "operating": {
                     *           "voltage": [
                     *             0,
                     *             0,
                     *             28.534,
                     *             28.54,
                     *             28.003,
                     *             28.39,
                     *             27.786,
                     *             0
                     *           ],
                     *           "current": [
                     *             0,
                     *             0,
                     *             1.151,
                     *             5.397,
                     *             7.793,
                     *             4.533,
                     *             0.576,
                     *             0
                     *           ],
                     *           "power": [
                     *             0,
                     *             0,
                     *             32.85,
                     *             154.019,
                     *             218.241,
                     *             128.682,
                     *             15.999,
                     *             0
                     *           ]
                     *         }
                     *       },
                     *       "module": {
                     *         "fit": "exact",
                     *         "circuit": {
                     *           "kind": "single-diode",
                     *           "cellsInSeries": 60,
                     *           "photocurrent": 9.91785,
                     *           "saturationCurrent": 2.22059e-11,
                     *           "seriesResistance": 0.284981,
                     *           "shuntResistance": 359.887,
                     *           "idealityVoltage": 1.45073,
                     *           "photocurrentCoefficient": 0.0499604,
                     *           "bandgap": 1.121,
                     *           "bandgapCoefficient": -0.0002677
                     *         },
                     *         "misfits": {
                     *           "shortCircuitCurrent": 0,
                     *           "openCircuitVoltage": 0,
                     *           "maximumPowerCurrent": 0,
                     *           "maximumPowerSlope": 0,
                     *           "openCircuitVoltageCoefficient": 0
                     *         }
                     *       },
                     *       "cautions": [
                     *         {
                     *           "code": "cold-voltage-not-checked",
                     *           "severity": "warning",
                     *           "detail": "No inputVoltageRating was given, so the open-circuit voltage of 42.8 V at 3.6 degC was not checked against it.",
                     *           "values": {
                     *             "temperature": 3.6,
                     *             "openCircuitVoltage": 42.79,
                     *             "moduleByCircuit": 41.2991,
                     *             "moduleByCoefficient": 41.3141,
                     *             "moduleByFactorTable": 42.79
                     *           }
                     *         },
                     *         {
                     *           "code": "series-cold-is-not-record-cold",
                     *           "severity": "info",
                     *           "detail": "The coldest temperature of the series, 3.6 degC, was taken; the site's record low is likely colder. Give recordLowTemperature.",
                     *           "values": {
                     *             "temperature": 3.6
                     *           }
                     *         },
                     *         {
                     *           "code": "open-circuit-at-each-sample",
                     *           "severity": "warning",
                     *           "detail": "The rule disconnects the array: its full open-circuit voltage stands at the input at each sample. Local codes and a licensed designer decide.",
                     *           "values": {
                     *             "openCircuitVoltage": 38.9
                     *           }
                     *         },
                     *         {
                     *           "code": "wind-assumed",
                     *           "severity": "info",
                     *           "detail": "No wind speed was given: 1 m/s was taken throughout for the cell temperature.",
                     *           "values": {
                     *             "windSpeed": 1
                     *           }
                     *         },
                     *         {
                     *           "code": "planning-estimate",
                     *           "severity": "info",
                     *           "detail": "Estimates for planning, not an electrical design. Photovoltaic strings are a shock, arc and fire hazard and cannot be switched off in daylight. Local codes and a licensed designer decide.",
                     *           "values": {}
                     *         }
                     *       ],
                     *       "provenance": {
                     *         "version": "0.1.0",
                     *         "models": [
                     *           {
                     *             "name": "datasheet-fit",
                     *             "version": "1",
                     *             "source": "De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88 (from memory), its five conditions"
                     *           },
                     *           {
                     *             "name": "single-diode",
                     *             "version": "1",
                     *             "source": "De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88 (from memory), its translation to irradiance and temperature"
                     *           },
                     *           {
                     *             "name": "cell-temperature-faiman",
                     *             "version": "1",
                     *             "source": "Faiman, Prog. Photovolt. 16 (2008) 307-315"
                     *           },
                     *           {
                     *             "name": "fractional-open-circuit-voltage",
                     *             "version": "1",
                     *             "source": "Enslin, Wolf, Snyman & Swiegers, IEEE Trans. Ind. Electron. 44(6) (1997) 769-773 (fraction .76; from memory); Esram & Chapman, IEEE Trans. Energy Convers. 22(2) (2007) 439-449 (.71 to .78; from memory)"
                     *           },
                     *           {
                     *             "name": "steady-tracking",
                     *             "version": "1",
                     *             "source": "own derivation: each sample at rest, the causes telescoping from available to delivered power"
                     *           }
                     *         ],
                     *         "inputDigest": "e6411bbec2f4de551265fc7f69490fbc8865d5d372750b92236f25ffd3607d54"
                     *       }
                     *     }
                     */
                    "application/json": components["schemas"]["EstimateAnswer"];
                };
            };
            /** @description `malformed-request`: The HTTP parser could not read the request. `malformed-body`: Not UTF-8, not JSON, nested too deep, or not gzip. */
            400: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unauthorized`: No key, or none that is known. */
            401: {
                headers: {
                    "www-authenticate": components["headers"]["WwwAuthenticate"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `method-not-allowed`: The Allow header names those that do. */
            405: {
                headers: {
                    allow: components["headers"]["Allow"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `not-acceptable`: The Accept header rules out application/json, or application/x-ndjson for a portfolio. */
            406: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `too-slow`: No byte of it arrived for a while, or it took too long as a whole. */
            408: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `body-too-large`: Above the limit of at most 67108864 bytes, or of 16777216 for a line of a portfolio, decompressed. */
            413: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unsupported-media-type`: The body must be application/json in UTF-8, or application/x-ndjson for a portfolio, plain or gzip. */
            415: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `invalid-request`: Schema, relations or physics; every error says where and what would be right. `too-much-work`: Refused before starting, with the estimate and the limit. `time-limit-exceeded`: Stopped at the limit of computing time; the same request would end the same. */
            422: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `headers-too-large`: Request line and headers exceed 16 KiB. */
            431: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `internal`: A defect of the service; the request id finds it in the log. `worker-lost`: The worker died or ran out of memory with this request; do not simply retry. */
            500: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `overloaded`: The queue is full; nothing was begun. Retry after the time that Retry-After says. `draining`: Nothing was begun; another replica, or this one after its restart, will answer. */
            503: {
                headers: {
                    "retry-after": components["headers"]["RetryAfter"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
        };
    };
    fitModule: {
        parameters: {
            query?: never;
            header?: {
                /** @description An id of the caller's for log and answer; one that does not match the pattern is replaced. */
                "x-request-id"?: components["parameters"]["RequestId"];
            };
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                /**
                 * @example {
                 *       "module": {
                 *         "kind": "datasheet",
                 *         "cellsInSeries": 60,
                 *         "shortCircuitCurrent": 9.91,
                 *         "openCircuitVoltage": 38.9,
                 *         "maximumPowerCurrent": 9.36,
                 *         "maximumPowerVoltage": 31.8,
                 *         "shortCircuitCurrentCoefficient": 0.05,
                 *         "openCircuitVoltageCoefficient": -0.29
                 *       }
                 *     }
                 */
                "application/json": components["schemas"]["ModuleFitRequest"];
            };
        };
        responses: {
            /** @description The circuit and its misfits. */
            200: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    /**
                     * @example {
                     *       "fit": "exact",
                     *       "circuit": {
                     *         "kind": "single-diode",
                     *         "cellsInSeries": 60,
                     *         "photocurrent": 9.91785,
                     *         "saturationCurrent": 2.22059e-11,
                     *         "seriesResistance": 0.284981,
                     *         "shuntResistance": 359.887,
                     *         "idealityVoltage": 1.45073,
                     *         "photocurrentCoefficient": 0.0499604,
                     *         "bandgap": 1.121,
                     *         "bandgapCoefficient": -0.0002677
                     *       },
                     *       "misfits": {
                     *         "shortCircuitCurrent": 0,
                     *         "openCircuitVoltage": 0,
                     *         "maximumPowerCurrent": 0,
                     *         "maximumPowerSlope": 0,
                     *         "openCircuitVoltageCoefficient": 0
                     *       },
                     *       "measured": null,
                     *       "rootMeanSquareError": null,
                     *       "standard": {
                     *         "maximumPowerVoltage": 31.8,
                     *         "maximumPowerCurrent": 9.36,
                     *         "maximumPower": 297.648,
                     *         "openCircuitVoltage": 38.9,
                     *         "shortCircuitCurrent": 9.91,
                     *         "openCircuitVoltageCoefficient": -0.29
                     *       },
                     *       "provenance": {
                     *         "version": "0.1.0",
                     *         "models": [
                     *           {
                     *             "name": "datasheet-fit",
                     *             "version": "1",
                     *             "source": "De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88 (from memory), its five conditions"
                     *           }
                     *         ],
                     *         "inputDigest": "9f64a03d8d5e8a3dba80e0004bb6ce92c0275b210ed61d4f6185f81158d364c9"
                     *       }
                     *     }
                     */
                    "application/json": components["schemas"]["ModuleFitAnswer"];
                };
            };
            /** @description `malformed-request`: The HTTP parser could not read the request. `malformed-body`: Not UTF-8, not JSON, nested too deep, or not gzip. */
            400: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unauthorized`: No key, or none that is known. */
            401: {
                headers: {
                    "www-authenticate": components["headers"]["WwwAuthenticate"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `method-not-allowed`: The Allow header names those that do. */
            405: {
                headers: {
                    allow: components["headers"]["Allow"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `not-acceptable`: The Accept header rules out application/json, or application/x-ndjson for a portfolio. */
            406: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `too-slow`: No byte of it arrived for a while, or it took too long as a whole. */
            408: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `body-too-large`: Above the limit of at most 67108864 bytes, or of 16777216 for a line of a portfolio, decompressed. */
            413: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unsupported-media-type`: The body must be application/json in UTF-8, or application/x-ndjson for a portfolio, plain or gzip. */
            415: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `invalid-request`: Schema, relations or physics; every error says where and what would be right. `too-much-work`: Refused before starting, with the estimate and the limit. `time-limit-exceeded`: Stopped at the limit of computing time; the same request would end the same. */
            422: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `headers-too-large`: Request line and headers exceed 16 KiB. */
            431: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `internal`: A defect of the service; the request id finds it in the log. `worker-lost`: The worker died or ran out of memory with this request; do not simply retry. */
            500: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `overloaded`: The queue is full; nothing was begun. Retry after the time that Retry-After says. `draining`: Nothing was begun; another replica, or this one after its restart, will answer. */
            503: {
                headers: {
                    "retry-after": components["headers"]["RetryAfter"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
        };
    };
    portfolio: {
        parameters: {
            query?: never;
            header?: {
                /** @description An id of the caller's for log and answer; one that does not match the pattern is replaced. */
                "x-request-id"?: components["parameters"]["RequestId"];
            };
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                /**
                 * @example {"kind":"defaults","module":{"kind":"datasheet","cellsInSeries":60,"shortCircuitCurrent":9.91,"openCircuitVoltage":38.9,"maximumPowerCurrent":9.36,"maximumPowerVoltage":31.8,"shortCircuitCurrentCoefficient":0.05,"openCircuitVoltageCoefficient":-0.29},"candidates":[{"label":"one voltage","rule":{"kind":"constant-voltage","setVoltagePerModule":29},"price":120},{"label":"climbs","rule":{"kind":"perturb-and-observe","stepFraction":0.005},"price":180}],"baseline":"one voltage"}
                 *     {"kind":"climate","name":"south shore","climate":{"start":"2025-04-12T00:00:00+02:00","step":10800,"irradiance":{"kind":"plane-of-array","values":[0,0,120,560,810,470,60,0]},"temperature":{"kind":"ambient","values":[4.1,3.6,7.2,11.8,14.9,14.1,9.3,6]}}}
                 *     {"kind":"site","id":"Heron Bank","climate":{"kind":"named","name":"south shore"}}
                 *     {"kind":"site","id":"Old Groyne","climate":{"kind":"named","name":"south shore"},"count":3,"group":"groynes"}
                 */
                "application/x-ndjson": string;
            };
        };
        responses: {
            /** @description One line for each site, and the totals. */
            200: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/x-ndjson": string;
                };
            };
            /** @description `malformed-request`: The HTTP parser could not read the request. `malformed-body`: Not UTF-8, not JSON, nested too deep, or not gzip. */
            400: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unauthorized`: No key, or none that is known. */
            401: {
                headers: {
                    "www-authenticate": components["headers"]["WwwAuthenticate"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `method-not-allowed`: The Allow header names those that do. */
            405: {
                headers: {
                    allow: components["headers"]["Allow"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `not-acceptable`: The Accept header rules out application/json, or application/x-ndjson for a portfolio. */
            406: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `too-slow`: No byte of it arrived for a while, or it took too long as a whole. */
            408: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `body-too-large`: Above the limit of at most 67108864 bytes, or of 16777216 for a line of a portfolio, decompressed. */
            413: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unsupported-media-type`: The body must be application/json in UTF-8, or application/x-ndjson for a portfolio, plain or gzip. */
            415: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `invalid-request`: Schema, relations or physics; every error says where and what would be right. `too-much-work`: Refused before starting, with the estimate and the limit. `time-limit-exceeded`: Stopped at the limit of computing time; the same request would end the same. */
            422: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `headers-too-large`: Request line and headers exceed 16 KiB. */
            431: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `internal`: A defect of the service; the request id finds it in the log. `worker-lost`: The worker died or ran out of memory with this request; do not simply retry. */
            500: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `overloaded`: The queue is full; nothing was begun. Retry after the time that Retry-After says. `draining`: Nothing was begun; another replica, or this one after its restart, will answer. */
            503: {
                headers: {
                    "retry-after": components["headers"]["RetryAfter"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
        };
    };
    rules: {
        parameters: {
            query?: never;
            header?: {
                /** @description An id of the caller's for log and answer; one that does not match the pattern is replaced. */
                "x-request-id"?: components["parameters"]["RequestId"];
            };
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description The rules, in the order they are shown. */
            200: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": components["schemas"]["RuleCatalogue"];
                };
            };
            /** @description `malformed-request`: The HTTP parser could not read the request. */
            400: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unauthorized`: No key, or none that is known. */
            401: {
                headers: {
                    "www-authenticate": components["headers"]["WwwAuthenticate"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `method-not-allowed`: The Allow header names those that do. */
            405: {
                headers: {
                    allow: components["headers"]["Allow"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `not-acceptable`: The Accept header rules out application/json, or application/x-ndjson for a portfolio. */
            406: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `headers-too-large`: Request line and headers exceed 16 KiB. */
            431: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `internal`: A defect of the service; the request id finds it in the log. */
            500: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
        };
    };
    tune: {
        parameters: {
            query?: never;
            header?: {
                /** @description An id of the caller's for log and answer; one that does not match the pattern is replaced. */
                "x-request-id"?: components["parameters"]["RequestId"];
            };
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                /**
                 * @example {
                 *       "module": {
                 *         "kind": "datasheet",
                 *         "cellsInSeries": 60,
                 *         "shortCircuitCurrent": 9.91,
                 *         "openCircuitVoltage": 38.9,
                 *         "maximumPowerCurrent": 9.36,
                 *         "maximumPowerVoltage": 31.8,
                 *         "shortCircuitCurrentCoefficient": 0.05,
                 *         "openCircuitVoltageCoefficient": -0.29
                 *       },
                 *       "climate": {
                 *         "start": "2025-04-12T00:00:00+02:00",
                 *         "step": 10800,
                 *         "irradiance": {
                 *           "kind": "plane-of-array",
                 *           "values": [
                 *             0,
                 *             0,
                 *             120,
                 *             560,
                 *             810,
                 *             470,
                 *             60,
                 *             0
                 *           ]
                 *         },
                 *         "temperature": {
                 *           "kind": "ambient",
                 *           "values": [
                 *             4.1,
                 *             3.6,
                 *             7.2,
                 *             11.8,
                 *             14.9,
                 *             14.1,
                 *             9.3,
                 *             6
                 *           ]
                 *         }
                 *       },
                 *       "rule": {
                 *         "kind": "fractional-open-circuit-voltage"
                 *       },
                 *       "parameter": "fraction",
                 *       "range": {
                 *         "from": 0.7,
                 *         "to": 0.9
                 *       }
                 *     }
                 */
                "application/json": components["schemas"]["TuningRequest"];
            };
        };
        responses: {
            /** @description The optimum and the loss curve. */
            200: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    /**
                     * @example {
                     *       "parameter": "fraction",
                     *       "unit": "1, of the sampled open-circuit voltage",
                     *       "today": {
                     *         "value": 0.76,
                     *         "lost": 0.119098,
                     *         "lostFraction": 0.0673451
                     *       },
                     *       "optimum": {
                     *         "value": 0.833599,
                     *         "lost": 0.0348768,
                     *         "lostFraction": 0.0197214
                     *       },
                     *       "flatRange": {
                     *         "from": 0.824907,
                     *         "to": 0.84148
                     *       },
                     *       "curve": [
                     *         {
                     *           "value": 0.7,
                     *           "lost": 0.238309,
                     *           "lostFraction": 0.134754
                     *         },
                     *         {
                     *           "value": 0.705,
                     *           "lost": 0.227855,
                     *           "lostFraction": 0.128843
                     *         },
                     *         {
                     *           "value": 0.71,
                     *           "lost": 0.21746,
                     *           "lostFraction": 0.122965
                     *         },
                     *         {
                     *           "value": 0.715,
                     *           "lost": 0.207132,
                     *           "lostFraction": 0.117125
                     *         },
                     *         {
                     *           "value": 0.72,
                     *           "lost": 0.196878,
                     *           "lostFraction": 0.111327
                     *         },
                     *         {
                     *           "value": 0.725,
                     *           "lost": 0.18671,
                     *           "lostFraction": 0.105577
                     *         },
                     *         {
                     *           "value": 0.73,
                     *           "lost": 0.176639,
                     *           "lostFraction": 0.0998824
                     *         },
                     *         {
                     *           "value": 0.735,
                     *           "lost": 0.166678,
                     *           "lostFraction": 0.0942495
                     *         },
                     *         {
                     *           "value": 0.74,
                     *           "lost": 0.15684,
                     *           "lostFraction": 0.088687
                     *         },
                     *         {
                     *           "value": 0.745,
                     *           "lost": 0.147144,
                     *           "lostFraction": 0.083204
                     *         },
                     *         {
                     *           "value": 0.75,
                     *           "lost": 0.137607,
                     *           "lostFraction": 0.0778112
                     *         },
                     *         {
                     *           "value": 0.755,
                     *           "lost": 0.12825,
                     *           "lostFraction": 0.0725204
                     *         },
                     *         {
                     *           "value": 0.76,
                     *           "lost": 0.119098,
                     *           "lostFraction": 0.0673451
                     *         },
                     *         {
                     *           "value": 0.765,
                     *           "lost": 0.110176,
                     *           "lostFraction": 0.0623003
                     *         },
                     *         {
                     *           "value": 0.77,
                     *           "lost": 0.101516,
                     *           "lostFraction": 0.0574031
                     *         },
                     *         {
                     *           "value": 0.775,
                     *           "lost": 0.0931497,
                     *           "lostFraction": 0.0526725
                     *         },
                     *         {
                     *           "value": 0.78,
                     *           "lost": 0.0851162,
                     *           "lostFraction": 0.0481298
                     *         },
                     *         {
                     *           "value": 0.785,
                     *           "lost": 0.0774573,
                     *           "lostFraction": 0.043799
                     *         },
                     *         {
                     *           "value": 0.79,
                     *           "lost": 0.0702203,
                     *           "lostFraction": 0.0397068
                     *         },
                     *         {
                     *           "value": 0.795,
                     *           "lost": 0.0634578,
                     *           "lostFraction": 0.0358829
                     *         },
                     *         {
                     *           "value": 0.8,
                     *           "lost": 0.0572285,
                     *           "lostFraction": 0.0323604
                     *         },
                     *         {
                     *           "value": 0.805,
                     *           "lost": 0.0515971,
                     *           "lostFraction": 0.0291761
                     *         },
                     *         {
                     *           "value": 0.81,
                     *           "lost": 0.0466354,
                     *           "lostFraction": 0.0263705
                     *         },
                     *         {
                     *           "value": 0.815,
                     *           "lost": 0.0424227,
                     *           "lostFraction": 0.0239883
                     *         },
                     *         {
                     *           "value": 0.82,
                     *           "lost": 0.0390457,
                     *           "lostFraction": 0.0220788
                     *         },
                     *         {
                     *           "value": 0.825,
                     *           "lost": 0.0365998,
                     *           "lostFraction": 0.0206957
                     *         },
                     *         {
                     *           "value": 0.83,
                     *           "lost": 0.0351889,
                     *           "lostFraction": 0.0198979
                     *         },
                     *         {
                     *           "value": 0.835,
                     *           "lost": 0.0349257,
                     *           "lostFraction": 0.0197491
                     *         },
                     *         {
                     *           "value": 0.84,
                     *           "lost": 0.0359324,
                     *           "lostFraction": 0.0203183
                     *         },
                     *         {
                     *           "value": 0.845,
                     *           "lost": 0.0383404,
                     *           "lostFraction": 0.0216799
                     *         },
                     *         {
                     *           "value": 0.85,
                     *           "lost": 0.0422904,
                     *           "lostFraction": 0.0239136
                     *         },
                     *         {
                     *           "value": 0.855,
                     *           "lost": 0.0479327,
                     *           "lostFraction": 0.027104
                     *         },
                     *         {
                     *           "value": 0.86,
                     *           "lost": 0.0554263,
                     *           "lostFraction": 0.0313414
                     *         },
                     *         {
                     *           "value": 0.865,
                     *           "lost": 0.064939,
                     *           "lostFraction": 0.0367204
                     *         },
                     *         {
                     *           "value": 0.87,
                     *           "lost": 0.0766466,
                     *           "lostFraction": 0.0433406
                     *         },
                     *         {
                     *           "value": 0.875,
                     *           "lost": 0.0907323,
                     *           "lostFraction": 0.0513055
                     *         },
                     *         {
                     *           "value": 0.88,
                     *           "lost": 0.107385,
                     *           "lostFraction": 0.0607222
                     *         },
                     *         {
                     *           "value": 0.885,
                     *           "lost": 0.126801,
                     *           "lostFraction": 0.071701
                     *         },
                     *         {
                     *           "value": 0.89,
                     *           "lost": 0.149178,
                     *           "lostFraction": 0.0843544
                     *         },
                     *         {
                     *           "value": 0.895,
                     *           "lost": 0.174719,
                     *           "lostFraction": 0.0987967
                     *         },
                     *         {
                     *           "value": 0.9,
                     *           "lost": 0.203627,
                     *           "lostFraction": 0.115143
                     *         }
                     *       ],
                     *       "sites": [
                     *         {
                     *           "id": "site",
                     *           "available": 1.76847,
                     *           "optimum": {
                     *             "value": 0.833599,
                     *             "lost": 0.0348768,
                     *             "lostFraction": 0.0197214
                     *           },
                     *           "atCommon": {
                     *             "value": 0.833599,
                     *             "lost": 0.0348768,
                     *             "lostFraction": 0.0197214
                     *           },
                     *           "regret": 0
                     *         }
                     *       ],
                     *       "mode": "steady",
                     *       "provenance": {
                     *         "version": "0.1.0",
                     *         "models": [
                     *           {
                     *             "name": "datasheet-fit",
                     *             "version": "1",
                     *             "source": "De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88 (from memory), its five conditions"
                     *           },
                     *           {
                     *             "name": "single-diode",
                     *             "version": "1",
                     *             "source": "De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88 (from memory), its translation to irradiance and temperature"
                     *           },
                     *           {
                     *             "name": "cell-temperature-faiman",
                     *             "version": "1",
                     *             "source": "Faiman, Prog. Photovolt. 16 (2008) 307-315"
                     *           },
                     *           {
                     *             "name": "fractional-open-circuit-voltage",
                     *             "version": "1",
                     *             "source": "Enslin, Wolf, Snyman & Swiegers, IEEE Trans. Ind. Electron. 44(6) (1997) 769-773 (fraction .76; from memory); Esram & Chapman, IEEE Trans. Energy Convers. 22(2) (2007) 439-449 (.71 to .78; from memory)"
                     *           },
                     *           {
                     *             "name": "tuning",
                     *             "version": "1",
                     *             "source": "own derivation: the loss curve sampled, its lowest bracket closed in"
                     *           }
                     *         ],
                     *         "inputDigest": "fe7acaf8100c309d8184bc21f3f66fa7a292d85b9b77ec90c023ea1b75a6bde9"
                     *       }
                     *     }
                     */
                    "application/json": components["schemas"]["TuningAnswer"];
                };
            };
            /** @description `malformed-request`: The HTTP parser could not read the request. `malformed-body`: Not UTF-8, not JSON, nested too deep, or not gzip. */
            400: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unauthorized`: No key, or none that is known. */
            401: {
                headers: {
                    "www-authenticate": components["headers"]["WwwAuthenticate"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `method-not-allowed`: The Allow header names those that do. */
            405: {
                headers: {
                    allow: components["headers"]["Allow"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `not-acceptable`: The Accept header rules out application/json, or application/x-ndjson for a portfolio. */
            406: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `too-slow`: No byte of it arrived for a while, or it took too long as a whole. */
            408: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `body-too-large`: Above the limit of at most 67108864 bytes, or of 16777216 for a line of a portfolio, decompressed. */
            413: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `unsupported-media-type`: The body must be application/json in UTF-8, or application/x-ndjson for a portfolio, plain or gzip. */
            415: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `invalid-request`: Schema, relations or physics; every error says where and what would be right. `too-much-work`: Refused before starting, with the estimate and the limit. `time-limit-exceeded`: Stopped at the limit of computing time; the same request would end the same. */
            422: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `headers-too-large`: Request line and headers exceed 16 KiB. */
            431: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `internal`: A defect of the service; the request id finds it in the log. `worker-lost`: The worker died or ran out of memory with this request; do not simply retry. */
            500: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `overloaded`: The queue is full; nothing was begun. Retry after the time that Retry-After says. `draining`: Nothing was begun; another replica, or this one after its restart, will answer. */
            503: {
                headers: {
                    "retry-after": components["headers"]["RetryAfter"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
        };
    };
    version: {
        parameters: {
            query?: never;
            header?: {
                /** @description An id of the caller's for log and answer; one that does not match the pattern is replaced. */
                "x-request-id"?: components["parameters"]["RequestId"];
            };
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description Version and limits. */
            200: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    /**
                     * @example {
                     *       "name": "kneegap",
                     *       "version": "0.1.0",
                     *       "limits": {
                     *         "bodyBytes": 67108864,
                     *         "samples": 600000,
                     *         "candidates": 24,
                     *         "controlPeriods": 200000000,
                     *         "computeSeconds": 50,
                     *         "lineBytes": 16777216,
                     *         "sites": 100000,
                     *         "namedClimates": 64,
                     *         "namedClimateBytes": 67108864
                     *       }
                     *     }
                     */
                    "application/json": components["schemas"]["VersionAnswer"];
                };
            };
            /** @description `malformed-request`: The HTTP parser could not read the request. */
            400: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `method-not-allowed`: The Allow header names those that do. */
            405: {
                headers: {
                    allow: components["headers"]["Allow"];
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `not-acceptable`: The Accept header rules out application/json, or application/x-ndjson for a portfolio. */
            406: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `headers-too-large`: Request line and headers exceed 16 KiB. */
            431: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
            /** @description `internal`: A defect of the service; the request id finds it in the log. */
            500: {
                headers: {
                    "x-request-id": components["headers"]["RequestId"];
                    [name: string]: unknown;
                };
                content: {
                    "application/problem+json": components["schemas"]["Problem"];
                };
            };
        };
    };
}
