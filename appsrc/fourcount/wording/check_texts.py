"""The words of the check: one sentence for every finding, and the parts that go into it."""

from __future__ import annotations

BY = " by {methods} at {level}"
TEXTS = {
    "reproduced": "{printed} follows from {given}: the {name} is {ours}{by}.",
    "other-sign": "{printed} follows from {given}{turned}: {ours}{by}.",
    "other-name": "Check the name: {printed}, printed as {says}, fits the {name}, {ours}{by}{own}.{chance}",
    "other-way-round": "Check which way round: {printed} fits the {name} {side}, {ours}{by}{own}.{chance}",
    "other-name-and-way": "Check the name and which way round: {printed}, printed as {says}, fits the {name} {side}, "
    "{ours}{by}{own}.{chance}",
    "other-level": "Check {what}: {printed}{called} fits the {name}{sided} at {level}, {ours}, by {methods}{not_level}."
    "{chance}",
    "other-analysis": "Check the analysis: {printed} fits the {name}{sided}, {ours}{by}{own}.{chance}",
    "also-fits": "It also fits the {name}{sided}, {ours}{by}.",
    "estimate-only": "The estimate follows from {given}{turned}; check the limits: {nearest}. An adjusted model, or "
    "another method or level, may be behind the printed ones.",
    "estimate-other-name": "Check the name: the estimate, printed as {says}, fits the {name}, {ours}{own}; no method "
    "here gives the printed limits.",
    "estimate-other-analysis": "Check the analysis: the estimate fits the {name}{sided}, {ours}{own}; no method here "
    "gives the printed limits.",
    "estimate-other-way": "Check which way round: the estimate fits the {name} {side}, {ours}{own}; no method here "
    "gives the printed limits.",
    "estimate-other-name-and-way": "Check the figure: its estimate fits the {name} {side}, {ours}{own}, which may be "
    "chance.",
    "one-limit": "Check the {limit} limit: {methods} at {level} {gives} {one}, not {printed_one}, while the other "
    "limit and the estimate fit{slip}.",
    "interval-only": "Check the estimate: the limits are those of the {name}{sided}{by}, and its estimate is "
    "{estimate}{slip}.",
    "cut-off": "Check the last digits: the {name}{sided} is {ours}{by}, and the print leaves the further digits off "
    "instead of rounding.",
    "last-digit": "Check the last digit: the {name}{sided} is {ours}{by}; rounding on the way there would explain it.",
    "nearest": "Check {printed}: {given} give {ours} for the {name}{sided}{by}. An adjustment, or other denominators, "
    "may explain it.",
    "not-given": "Check {printed}: {given} give no {name}.",
    "adjusted": "{printed} is printed as adjusted and need not follow from {given}{crude}.",
    "adjusted-is-crude": "Check the adjustment: {printed}, printed as adjusted, is the crude {name}, {ours}{by}.",
    "no-hazard-ratio": "A hazard ratio cannot be worked out from {given}{instead}.",
    "symmetric": "The limits lie evenly round the estimate{scale}, as those of most methods do.",
    "not-symmetric": "Check the limits: they do not lie evenly round the estimate{scale}{mirrored}{slips}. Score, "
    "exact and profile intervals need not.",
    "limits-disordered": "Check the limits: they are not in order, or the estimate does not lie between them.",
    "percent-none": "Check the percentage: no whole number of {total} gives {printed}; {events} of {total} is {own}.",
    "percent-none-of-total": "Check {text}: no whole number of {total} gives {percent}%; {events} of {total} is "
    "{share}.",
    "other-counts": "Check the counts: the print follows from {first} of {first_total} and {second} of {second_total}, "
    "for instance, which round to the same percentages; the figures here are those of {first_taken} and "
    "{second_taken}.",
    "percent-other-count": "Check {text}: {percent}% of {total} is {fitting}, while {events} is {share}.",
}
"""One sentence for every finding but those about p."""

NOTES = ("adjusted", "no-hazard-ratio", "symmetric", "p-unchecked", "p-zero")
"""Findings that neither confirm the print nor ask to check it."""

BY_SHOWN = " by the method shown, {first},{rest} at {level}"
REST = " or by {methods},"
NO_METHOD_GIVEN = "no method here gives limits"
NEAREST = "the nearest, {methods}, gives {limits} at {level}"
NEAREST_SHOWN = "the method shown, {methods}, gives {limits} at {level}"
NEAREST_TOO = ", and the nearest, {methods}, {limits}"
GIVE = {True: "give", False: "gives"}
REDUCTION, OTHER_SIGN = ", printed as a reduction", ", printed with the other sign"
CRUDE = ", whose crude {name} is {ours}"
INSTEAD = "; the {name} here is {ours}, which need not agree"
FITS_AS_WELL = ", but {printed} fits the {name} as well: {ours}{by}"
OWN = ", while the {name} is {value}"
OWN_CLUSTERED = "; allowing for them, it is {value}"
OWN_AS_ENTERED = ", while as entered it is {value}"
AT_ANOTHER_LEVEL = {0: "the level", 1: "the name and the level", 2: "which way round, and the level"}
ALL_OF_THEM = "the name, which way round, and the level"
CALLED = ", printed as {says},"
NOT_LEVEL = ", while the paper says {level}"
NO_LEVEL = ", and the paper names no level"
SLIP = "; two of its digits may have changed places"
CHANCE = " So few digits may fit by chance."
LOG_SCALE = " on the log scale"
MIRRORED = ": {pairs} would be even"
SLIPS = ", and so would {parts}, with two digits in each other’s place"
PARTS = {"low": "a lower limit of {text}", "high": "an upper limit of {text}", "estimate": "an estimate of {text}"}
LIMITS = {"low": "lower", "high": "upper"}
ADOPT = "Use the paper’s method: {family}, {level}"
UNKNOWN = "Check {printed}."
