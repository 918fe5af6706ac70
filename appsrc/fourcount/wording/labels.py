"""The words of the window's own fields, choices and commands."""

from __future__ import annotations

COLUMNS = {"printed": "As printed", "says": "What it says", "patient": "For one patient", "cautions": "Cautions"}

FIELDS = {
    "title_text": "Title of the paper",
    "source_text": "Where the numbers stand",
    "design": "Study",
    "name_text": "Outcome",
    "other_than": "Not",
    "left_words_text": "People who",
    "welcome": "Event is welcome or not",
    "span_text": "Time span",
    "form": "Printed as",
    "layout": "Groups run",
    "starting_risk_text": "Starting risk",
    "starting_risk_source_text": "Its source",
    "effect": "Effect used",
    "family": "Intervals",
    "level": "Confidence level",
    "label": "Name of the {group}",
    "heading": "Short name of the {column} outcome",
    "unit_text": "Unit of person-time",
    "limits_level_text": "Level of the limits",
    "paper": "Paper says",
    "paper_measure": "What the paper calls it",
    "paper_text": "What the paper prints",
    "adjusted_for_text": "Adjusted",
    "rows_as": "Rows as",
    "stratum": "Name of row {number}",
}
"""Names of the fields, on screen and for a screen reader."""

HINTS = {
    "title_text": "Title of the paper",
    "source_text": "table, page or figure · no patient details",
    "name_text": "“falls”",
    "words": "“fell at least once”",
    "span_text": "“12 months”",
    "starting_risk_source_text": "a register · no patient details",
    "label": "name",
    "left_heading": "event",
    "right_heading": "no event",
    "left_heading_cases": "cases",
    "right_heading_cases": "controls",
    "left_heading_exposed": "exposed",
    "right_heading_exposed": "not exposed",
    "unit_text": "unit of time",
    "limits_level_text": "95%",
    "paper_text": "“0.54 (0.37 to 0.78)”",
    "adjusted_for_text": "for “age, sex”, or not at all",
    "stratum": "“under 65”",
    "count_of_percent": "= {count}",
}
"""What a field says while it is empty."""

DESIGNS = {
    "trial": "randomised trial",
    "cohort": "cohort study",
    "survey": "cross-sectional survey",
    "case-control": "case-control study",
    "matched": "matched case-control study",
    "paired": "crossover or paired study",
    "before-after": "before-after study",
}

WELCOME = {"unwelcome": "unwelcome", "welcome": "welcome"}

FORMS = {
    "events-and-others": "38 · 374",
    "events-of-total": "38 of 412",
    "percent-of-total": "9.2% of 412",
    "effect-only": "OR 0.49 (0.32–0.75)",
    "pairs": "pairs",
    "person-time": "38 in 4,120 person-years",
    "risk-at-time": "9% (6–12) at 2 years",
    "strata": "strata",
}
"""How a paper prints its result, by a specimen."""

FORM_NOTES = {
    "events-and-others": "events and others",
    "events-of-total": "events and all",
    "percent-of-total": "percentage and all",
    "effect-only": "no counts",
    "pairs": "matched or twice the same people",
    "person-time": "a rate",
    "risk-at-time": "follow-up varied",
    "strata": "several tables",
}
"""What a specimen stands for, in a word or two beside it."""

LAYOUTS = {"down": "groups down", "across": "groups across"}

FAMILIES = {"score": "score", "textbook": "textbook", "exact": "exact"}
EFFECTS = {"risk_ratio": "risk ratio", "odds_ratio": "odds ratio"}
LEVELS = {0.8: "80%", 0.9: "90%", 0.95: "95%", 0.98: "98%", 0.99: "99%", 0.999: "99.9%"}
INTERVALS_PREFIX = "Intervals: "
LEVEL_PREFIX = "Level: "

ROLES = {"index": "index", "reference": "reference", "counted": "counted", "others": "others counted"}
TOTAL = "total"
ALL = "all"

GROUP_NAMES = {"first": "first group", "second": "second group"}
CELL_NAMES = {
    "events-and-others": "{group}, {outcome}",
    "left": "{group}, {outcome}",
    "right": "{group}, all people",
    "percent": "{group}, percentage with {outcome}",
    "events": "{group}, events: {outcome}",
    "time": "{group}, person-time",
    "risk": "{group}, risk of {outcome}",
    "limits": "{group}, limits of the risk",
}
LIMITS = "limits"

INTERVAL_HEAD = "{level} interval"
WINDOW_TITLE = "Fourcount[*]"
TITLED_WINDOW = "{title}[*] · Fourcount"
"""The star in brackets stands for the platform's mark of unsaved work."""

FIRST_STEP = "New here? See an invented example"
PATIENT_WAITS = "The picture appears once the four counts are there."
PATIENT_WAITS_OTHERWISE = "What follows for a patient appears once the table is whole."
BASELINE_HINT = "{percent}"
BASELINE_HINT_NEEDED = "needed"

LINKS = {"help": "Methods and sources", "more": "More measures", "less": "Fewer measures"}

MENUS = {"file": "&File", "edit": "&Edit", "table": "&Table", "view": "&View", "help": "&Help"}

COMMANDS = {
    "new": "&New table",
    "example": "Open the &worked example",
    "quit": "&Quit",
    "undo": "&Undo",
    "redo": "&Redo",
    "copy-text": "Copy as &text",
    "copy-table": "Copy as a t&able",
    "copy-picture": "Copy the &picture",
    "swap": "&Swap groups",
    "count-other": "&Count the other outcome",
    "paste": "Paste a ta&ble or a sentence",
    "study": "Choose the kind of st&udy",
    "form": "Choose &how it is printed",
    "add-row": "Add a row to &the strata",
    "remove-row": "Remove the row &from the strata",
    "adopt": "Adopt the paper’s &method and level",
    "paper": "Go to what the pap&er says",
    "layout": "Groups &down or across",
    "clear": "C&lear the counts",
    "first-cell": "&Go to the first count",
    "baseline": "Go to the starting &risk",
    "level": "Another confidence le&vel…",
    "bigger": "La&rger text",
    "smaller": "S&maller text",
    "actual": "&Normal text size",
    "bars": "&Bars instead of people",
    "more": "M&ore measures",
    "methods": "&Methods and sources",
    "keys": "&Keys",
    "about": "&About Fourcount",
}
"""What each command is called in the menus; ``&`` stands before its access key."""

FORM_MENU = "Printed &as"
FORM_COMMAND = "&{number}  {specimen}, {note}"
COMMANDS |= {
    f"form-{form}": FORM_COMMAND.format(number=number, specimen=FORMS[form], note=note)
    for number, (form, note) in enumerate(FORM_NOTES.items(), start=1)
}

APPEARANCES = {
    "system": "Light or dark: as the s&ystem",
    "light": "L&ight",
    "dark": "&Dark",
    "high-light": "Li&ght, high contrast",
    "high-dark": "Dar&k, high contrast",
}

LINK_NAMES = {"count-other": "Count the other outcome"}
"""What a link is called in full, where its words are short."""

LINK_WORDS = {
    "swap": "Swap groups",
    "count-other": "Other outcome",
    "clear": "Clear",
    "paste": "Paste…",
    "copy-text": "Copy as text",
    "copy-table": "Copy as a table",
    "copy-picture": "Copy the picture",
}

COPIED = {
    "copy-text": "Copied as text.",
    "copy-table": "Copied as a table.",
    "copy-picture": "Copied as a picture.",
}
NOTHING_PASTED = "The table holds what was pasted already."
NOTHING_TO_COPY = "Nothing copied: the table is not whole."
RISK_OF_OTHER_GROUP = "The starting risk now stands for the other group."
CHOICES_AS_LAST = "Intervals as last chosen: {family}, {level}."
STUDY_FOLLOWED = "The study is now a {study}."
FORM_FOLLOWED = "Printed as is now: {specimen}, {note}."
OWN_RISK_SOURCE = "this study’s reference group"

LEVEL_TITLE = "Confidence level"
LEVEL_QUESTION = "A level from 80% to 99.9%:"

UNEXPECTED = (
    "Something unexpected happened ({name}); your table is untouched. Details without your numbers are in {place}."
)
UNEXPECTED_NO_LOG = "Something unexpected happened ({name}); your table is untouched."
DISMISS = "Dismiss"

KEYS_INTRO = "Tab goes through the fields in reading order. In the table, arrow keys and Enter go from count to count."
KEYS_ANYWHERE = "In the fields"
KEYS_MORE = (
    ("Tab, Shift+Tab", "next field, previous field"),
    ("Arrow keys, Enter", "from count to count; Enter at the end of strata adds a row"),
    ("{paste} in the first column", "a table or a sentence fills the table, anything else its field"),
    ("Enter or Space on a measure", "show or hide its working"),
    ("Escape", "leave what was pasted, close the working, a help window or the patient’s page"),
    ("Left, Right on the patient’s page", "the outcome before, the next one; Home and End: the first and the last"),
    ("Up, Down on the patient’s page", "move a page that is higher than the screen"),
)

ABOUT = (
    "Fourcount {version}",
    "Re-enter what a paper prints, see whether it adds up, what it says, and what that means for one patient.",
    "Free software under the MIT licence. It works offline and sends nothing; what it keeps is said in the help.",
    (
        "Text in the system’s font {font}; computed with numpy {numpy} and scipy {scipy}; drawn with Qt {qt} and "
        "matplotlib {matplotlib}."
    ),
)

HELP_TITLES = {"methods": "Methods and sources", "keys": "Keys", "about": "About Fourcount"}
HELP_TERMS = "What the words mean"
HELP_LETTERS = "The letters in the formulas"
HELP_LIMITS = "What this program leaves out, and what it is for"
NO_KEYS = "menu only"

MISSING = "Still to be filled in: {names}."


def window_title(title: str, file_name: str = "") -> str:
    """The window's title for a file's name, or for a paper's title without one; nothing in it stands for the mark."""
    name = title
    if file_name:
        from fourcount.record.entry.digits import specimen  # no first paint is of a file

        name = specimen(file_name)
    shown = " ".join(name.split()).replace("[*]", "[*][*]")
    return TITLED_WINDOW.format(title=shown) if shown else WINDOW_TITLE
