// A sheet with one of everything that a record shows.

export const PROBE = `# Borehole probe, first stage
  project: Ice survey
  number: BP-3
  author: -
  revision: B
  reason: gate resistor raised
  status: draft
> A piezo disc drives a JFET stage.
> Every unit has to work.

## Supply
V_DD = 18 V ± 4 %                        [regulator data sheet, table 3]
T_A = -12 degC in -40 degC .. 10 degC    [borehole log]
R_D = 6.8 kohm ± 1 %                     [stock list, resistors]
R_S = 1.2 kohm ± 1 %                     [same]  ; bypassed
R_x = 2.2 kohm                           [assumed]
> What follows is the part as bought.

## Device
Q1 = n-JFET
  I_DSS: 2.5 mA .. 7.5 mA at V_DS = 15 V     [data sheet Q1, p. 2]
  V_GSoff: -3.2 V .. -1.1 V at I_D = 100 nA  [same]
  lambda: 0.015 /V                           [assumed]
  V_DSmax: 30 V

## Stage
A1 = stage of Q1
  gate: 4.7 Mohm to 0 V, 47 nF to signal
  drain: R_D to V_DD, 1 uF to load
  source: R_S to 0 V, 100 uF to 0 V
  load: 1 Mohm to 0 V
  output: load
P1 = point of Q1
  I_D: 1 mA
  V_DS: 8 V  [bench]
R_fit = abs(P1.V_GS) / P1.I_D as kohm  ; what P1 would want

## Requirements
headroom = check A1.margin >= 1.5 V
current = check A1.I_D within 0.4 mA .. 2 mA

## Figures
F1 = plot transfer of A1
F2 = plot A1.I_D against R_S over 100 ohm .. 10 kohm log
`;
