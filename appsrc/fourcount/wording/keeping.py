"""The words of saving, opening and recovering a record, and the help on what is kept and where."""

from __future__ import annotations

FILE_COMMANDS = {
    "open": "&Open…",
    "save": "&Save",
    "save-as": "Save &as…",
    "kept": "&What is kept, and where",
}
RECENT_MENU = "Open &recent"
RECENT_ENTRY = "&{number}  {name}"
RECENT_FOLDER = "{name}  ({folder})"
CLEAR_RECENT = "&Clear this list"
KEEP_RECENT = "&Remember files here"
KEEP_ASIDE = "Set &unsaved work aside"

OPEN_TITLE, SAVE_TITLE = "Open a record", "Save the record"
FILE_FILTER = "Records of Fourcount (*.fourcount)"
ANY_FILTER = "All files (*)"
FIRST_NAME = "table"

SAVED = "Saved as {name}."
OPENED = "Opened {name}."
NOT_SAVED = "“{name}” is not saved: {reason} The work is still here, in the window."
FULL = "the disk may be full."
NO_FOLDER = "there is no folder {folder} any more."
A_FOLDER = "a folder has this name."
A_DEVICE = "what has this name is not an ordinary file."
NO_NAME = "no file can have this name."
A_REASON = "{reason}."
NO_REASON = "the system could not write it."
NOT_LOCAL = "Only a file on this computer or its network can be opened."
ONE_FILE = "One file at a time can be opened in a window."

CHANGED_ELSEWHERE = (
    "“{name}” has been changed outside this window. What you see is not what stands in the file now; before saving "
    "writes over it, you will be asked."
)
GONE = "“{name}” is no longer where it was. The work is here, in the window; saving writes the file again."
OPEN_ELSEWHERE = "“{name}” is open in another window, which now comes to the front."
OPEN_TWICE = (
    "“{name}” is open in another window too, which does not answer. Whichever of the two saves second will ask first."
)
ASIDE_FAILED = (
    "Unsaved work could not be set aside in {folder}: {reason} Nothing is lost while the window is open; save soon."
)
ASIDE_REFUSED = "This state can neither be saved nor set aside: {reason}"

UNTITLED = "this table"
LOSING_TITLE = "Unsaved changes"
LOSING_QUESTION = "Save the changes to {name}?"
LOSING_DETAIL = "Without saving, what you changed is lost."
OVER_TITLE = "The file has changed"
OVER_QUESTION = "“{name}” has been changed since this window last read or wrote it."
OVER_DETAIL = "Writing over it loses what another window, program or person put there."
OVER_YES = "Write over it"
OVER_AS = "Save under another name…"
EXISTS_TITLE = "There is such a file"
EXISTS_QUESTION = "“{name}” is there already."
EXISTS_DETAIL = "Writing over it loses what stands in it."

OFFER_TITLE = "Work that was not saved"
OFFER_HEAD = "Fourcount ended without closing, and had set this work aside."
OFFER_ASIDE = "Set aside"
OFFER_FILE = "In the file"
OFFER_FOR = "for {name}"
OFFER_NO_FILE = "It was never saved in a file."
OFFER_CHANGED = "The file has been changed since; saving will ask before it writes over it."
OFFER_SAME = "The file holds the same."
OFFER_UNDO = "Opened, it counts as unsaved, and undo shows what is in the file."
OFFER_BROKEN = "It cannot be read: {reason}"
OFFER_OPEN = "Open what was set aside"
OFFER_DELETE = "Delete it"
OFFER_LATER = "Decide later"
NO_TITLE = "no title"
MORE_OUTCOMES = "and {number} more"

MONTHS = (
    "January", "February", "March", "April", "May", "June", "July", "August", "September", "October", "November",
    "December",
)  # fmt: skip
WHEN = "{day} {month} {year}, {hour:02}:{minute:02}"

KEPT_TITLE = "What is kept, and where"
