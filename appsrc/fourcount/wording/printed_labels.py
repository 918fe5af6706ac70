"""The words of the first column beyond the four cells: pairs, strata, the check, fields that few need, a paste."""

from __future__ import annotations

PAPER_MEASURES = {
    "risk_ratio": "risk ratio",
    "odds_ratio": "odds ratio",
    "hazard_ratio": "hazard ratio",
    "rate_ratio": "rate ratio",
    "risk_difference": "risk difference",
    "rate_difference": "rate difference",
}
"""What a paper may call the result that it prints."""

COMPARING = "Comparing"
COMPARED_WITH = "with"
COMPARED_HINTS = {"first": "index group", "second": "reference"}

ROWS_AS = {True: "rows 38 of 412", False: "rows 38 · 374"}

PAIR_NAMES = {
    "first_left_text": "pairs: {outcome} on both sides",
    "first_right_text": "pairs: {outcome} on the side of {first} only",
    "second_left_text": "pairs: {outcome} on the side of {second} only",
    "second_right_text": "pairs: {outcome} on neither side",
}
PAIR_NOTES = {"first_right_text": "only {first}", "second_left_text": "only {second}"}
"""Under the two counts that a comparison of pairs rests on."""

SIDE_HINTS = {
    "matched": ("cases", "controls"),
    "before-after": ("after", "before"),
    "paired": ("first side", "second side"),
}
"""What the two sides of a pair are called while they have no name of the reader's own."""

STRATUM_CELL = "row {number}, {name}"

CHECK_HEAD = "Does it add up?"
CHECK_MARKS = {"=": "agrees", "?": "to check", "·": "note"}

OPTIONAL = {
    "counting": "People or events",
    "follow-up": "Follow-up varied",
    "losses": "Losses",
    "clusters": "Clusters",
    "adjusted": "Adjusted effect",
    "where": "Where it stands",
}
"""The links that open fields which few need."""

OPENED = "open below"
CLOSE_FIELDS = "Close {name}"
COUNTING = {"people": "people", "events": "events, several a person"}
FOLLOW_UP = {False: "as long for everybody", True: "varied between people"}
WHERE = {
    "": "not said",
    "abstract": "in the abstract",
    "text": "in the text",
    "table": "in a table",
    "figure": "in a figure",
    "supplement": "in a supplement",
}
OPTIONAL_FIELDS = {
    "counting": "What is counted",
    "follow-up": "Follow-up",
    "where": "The numbers stand",
    "losses": "Lost",
    "randomised_text": "randomised",
    "lost_text": "lost",
    "loss_ratio_text": "Risk of those lost, times that of those seen",
    "icc_text_short": "correlation",
    "cluster_size_text_short": "mean size",
    "adjusted_for_text_short": "for",
    "icc_text": "Intracluster correlation",
    "cluster_size_text": "Mean size of a cluster",
    "clusters": "Clusters",
    "adjusted": "Adjusted",
    "adjusted_measure": "What the adjusted effect is",
    "adjusted_text": "The adjusted effect as printed",
    "adjusted_for_text": "What it is adjusted for",
}
OPTIONAL_HINTS = {
    "icc_text": "“0.02”",
    "cluster_size_text": "“25”",
    "adjusted_text": "“0.58 (0.39–0.85)”",
    "adjusted_for_text": "“age, sex”",
    "randomised_text": "",
    "lost_text": "",
    "loss_ratio_text": "1",
}

PASTE_HEAD = "Understood from what was pasted"
PASTE_LINKS = {"take": "Take it", "turn": "Other way round", "leave": "Leave it"}
PASTED = "Pasted: {parts}."
PUT_AWAY = "The earlier table’s words and results were put away; undo brings them back."
PASTED_PARTS = {
    "table": "table",
    "labels": "groups",
    "headings": "outcomes",
    "words": "event",
    "span": "time span",
    "figures": "printed result",
}
ROW_PASTED = "Pasted: counts of row {number}."
NO_TABLE_PASTED = "Nothing pasted: no table, no sentence with counts."
COUNTS_NOT_UNDERSTOOD = "Nothing pasted: the numbers in this text were not understood. Type the counts."

ROW_LINKS = {"add": "Add a row", "remove": "Remove row {number}"}
