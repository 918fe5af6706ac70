"""Every command in one table: its menu, its keys, and whether it can be on or off."""

from __future__ import annotations

from typing import NamedTuple

from PySide6.QtGui import QAction, QActionGroup, QKeySequence
from PySide6.QtWidgets import QMainWindow, QMenu

from fourcount.face.look import APPEARANCES
from fourcount.record.outcome import FORMS
from fourcount.wording import labels

Keys = QKeySequence.StandardKey | str | None


class Command(NamedTuple):
    """A command: its key in the words, its menu, and its shortcut (a standard one follows the platform)."""

    key: str
    menu: str
    keys: Keys = None
    checkable: bool = False
    parts_from_last: bool = False


Standard = QKeySequence.StandardKey
COMMANDS = (
    Command("new", "file", Standard.New),
    Command("example", "file", "Ctrl+Shift+E"),
    Command("quit", "file", Standard.Quit, parts_from_last=True),
    Command("undo", "edit", Standard.Undo),
    Command("redo", "edit", Standard.Redo),
    Command("paste", "edit", "Ctrl+Shift+V", parts_from_last=True),
    Command("copy-text", "edit", "Ctrl+Shift+C", parts_from_last=True),
    Command("copy-table", "edit", "Ctrl+Shift+T"),
    Command("copy-picture", "edit", "Ctrl+Shift+P"),
    Command("swap", "table", "Ctrl+G"),
    Command("count-other", "table", "Ctrl+Shift+O"),
    Command("study", "table", "Ctrl+Shift+D", parts_from_last=True),
    Command("form", "table", "Ctrl+Shift+F"),
    Command("layout", "table", "Ctrl+Shift+L"),
    Command("add-row", "table", "Ctrl+Return", parts_from_last=True),
    Command("remove-row", "table", "Ctrl+Shift+Del"),
    Command("clear", "table", "Ctrl+Shift+Backspace"),
    Command("first-cell", "table", "Ctrl+1", parts_from_last=True),
    Command("baseline", "table", "Ctrl+2"),
    Command("paper", "table", "Ctrl+3"),
    Command("level", "table", "Ctrl+L", parts_from_last=True),
    Command("adopt", "table", "Ctrl+Shift+M"),
    Command("bigger", "view", Standard.ZoomIn),
    Command("smaller", "view", Standard.ZoomOut),
    Command("actual", "view", "Ctrl+0"),
    Command("bars", "view", "Ctrl+B", checkable=True, parts_from_last=True),
    Command("more", "view", "Ctrl+M", checkable=True),
    Command("methods", "help", Standard.HelpContents),
    Command("keys", "help", "Ctrl+/"),
    Command("about", "help", "Ctrl+Shift+A"),
)
"""All commands in the order of the menus, but for those that take a form of print."""

LATER_COMMANDS = (
    Command("open", "file", Standard.Open),
    Command("save", "file", Standard.Save),
    Command("save-as", "file", Standard.SaveAs),
    Command("handout", "file", Standard.Print),
    Command("own-line", "table", "Ctrl+4"),
    Command("show-patient", "view", "F11"),
    Command("curve", "view", "Ctrl+Shift+R"),
    Command("uncertainty", "picture", "Ctrl+Shift+I", checkable=True, parts_from_last=True),
    Command("relative", "picture", "Ctrl+Shift+B", checkable=True),
    Command("outcome-add", "outcomes", "Ctrl+Shift+N"),
    Command("outcome-copy", "outcomes", "Ctrl+D"),
    Command("outcome-next", "outcomes", "Ctrl+PgDown", parts_from_last=True),
    Command("outcome-previous", "outcomes", "Ctrl+PgUp"),
    Command("outcome-left", "outcomes", "Ctrl+Shift+PgUp"),
    Command("outcome-right", "outcomes", "Ctrl+Shift+PgDown"),
    Command("outcome-remove", "outcomes", "Ctrl+Shift+W", parts_from_last=True),
    Command("kept", "help", "Ctrl+Shift+K"),
)
"""Commands that are made once the window has painted."""

PLACES = {
    "open": "example", "save": "quit", "save-as": "quit", "handout": "quit", "show-patient": "bigger",
    "curve": "bigger", "kept": "about",
}  # fmt: skip
"""Before which command a later one stands in its menu, where that is not its end."""

FORM_COMMANDS = tuple(Command(f"form-{form}", "forms", f"F{number}") for number, form in enumerate(FORMS, start=2))
"""One for each form; they are made once the window has painted."""

MORE_KEYS = {"redo": "Ctrl+Y", "bigger": "Ctrl+=", "save-as": "Ctrl+Shift+S"}
"""Further keys that people expect, taken where the platform does not have them already."""


def make_actions(window: QMainWindow) -> dict[str, QAction]:
    """One action for each command, not connected yet."""
    actions = {command.key: _action(window, command, labels.COMMANDS[command.key]) for command in COMMANDS}
    if actions["quit"].shortcut().isEmpty():
        actions["quit"].setShortcut(QKeySequence("Ctrl+Q"))
    actions["about"].setMenuRole(QAction.MenuRole.AboutRole)
    actions["quit"].setMenuRole(QAction.MenuRole.QuitRole)
    return actions


def _action(window: QMainWindow, command: Command, words: str) -> QAction:
    action = QAction(words, window)
    action.setCheckable(command.checkable)
    if isinstance(command.keys, str):
        action.setShortcut(QKeySequence(command.keys))
    elif command.keys is not None:
        action.setShortcuts(command.keys)
    extra = MORE_KEYS.get(command.key)
    if extra and QKeySequence(extra) not in action.shortcuts():
        action.setShortcuts([*action.shortcuts(), QKeySequence(extra)])
    return action


def fill_menus(window: QMainWindow, actions: dict[str, QAction]) -> dict[str, QMenu]:
    """Hang the commands into the window's menus."""
    menus = {key: window.menuBar().addMenu(words) for key, words in labels.MENUS.items()}
    menus["forms"] = QMenu(labels.FORM_MENU, window)
    for command in COMMANDS:
        if command.parts_from_last:
            menus[command.menu].addSeparator()
        menus[command.menu].addAction(actions[command.key])
        if command.key == "form":
            menus["table"].addMenu(menus["forms"])
    return menus


def add_later(window: QMainWindow, menus: dict[str, QMenu], actions: dict[str, QAction]) -> dict[str, QAction]:
    """The commands that no first paint needs, hung into the menus, with menus of their own for picture and outcomes."""
    from fourcount.wording.patient_labels import OUTCOME_MENU, PICTURE_MENU

    menus["outcomes"], menus["picture"] = QMenu(OUTCOME_MENU, window), QMenu(PICTURE_MENU, window)
    words, made = command_names(), {}
    for command in LATER_COMMANDS:
        made[command.key] = _action(window, command, words[command.key])
        menu = menus[command.menu]
        if command.parts_from_last:
            menu.addSeparator()
        if command.key in PLACES:
            menu.insertAction(actions[PLACES[command.key]], made[command.key])
        else:
            menu.addAction(made[command.key])
    for before in (made["save"], made["handout"], actions["quit"]):
        menus["file"].insertSeparator(before)
    menus["view"].insertSeparator(actions["bigger"])
    menus["view"].insertMenu(actions["more"], menus["picture"])
    menus["table"].addSeparator()
    menus["table"].addMenu(menus["outcomes"])
    return made


def add_drawing(menu: QMenu, icons: str, arrangement: str) -> tuple[QActionGroup, QActionGroup]:
    """How people are drawn and how the groups stand, before what can be switched on; an action's data is its key."""
    from fourcount.wording.patient_labels import ARRANGEMENTS, ICONS

    groups = (QActionGroup(menu), QActionGroup(menu))
    first = menu.actions()[0]
    for group, choices, now in zip(groups, (ICONS, ARRANGEMENTS), (icons, arrangement), strict=True):
        menu.insertSeparator(first)
        for key, words in choices.items():
            action = QAction(words, group)
            action.setCheckable(True)
            action.setData(key)
            action.setChecked(key == now)
            menu.insertAction(first, action)
    return groups


def command_names() -> dict[str, str]:
    """What every command is called."""
    from fourcount.wording.keeping import FILE_COMMANDS
    from fourcount.wording.patient_labels import OUTCOME_COMMANDS, PATIENT_COMMANDS

    return labels.COMMANDS | FILE_COMMANDS | PATIENT_COMMANDS | OUTCOME_COMMANDS


def add_forms(window: QMainWindow, menu: QMenu) -> dict[str, QAction]:
    """One action for each form of print, in the menu of forms; an action's data is its form."""
    actions = {}
    for command, form in zip(FORM_COMMANDS, FORMS, strict=True):
        action = QAction(labels.COMMANDS[command.key], window)
        action.setShortcut(QKeySequence(str(command.keys)))
        action.setData(form)
        menu.addAction(action)
        actions[command.key] = action
    return actions


def add_appearances(window: QMainWindow, menu: QMenu, now: str) -> QActionGroup:
    """One action for each appearance, of which one is on; an action's data is its key."""
    group = QActionGroup(window)
    menu.addSeparator()
    for key in APPEARANCES:
        action = QAction(labels.APPEARANCES[key], group)
        action.setCheckable(True)
        action.setData(key)
        action.setChecked(key == now)
        menu.addAction(action)
    return group


def shortcut_table(actions: dict[str, QAction]) -> dict[str, list[tuple[str, str]]]:
    """Menu by menu, each command's keys as the platform writes them, and its name."""
    from fourcount.wording.patient_labels import OUTCOME_MENU, PICTURE_MENU

    names = labels.MENUS | {"forms": labels.FORM_MENU, "picture": PICTURE_MENU, "outcomes": OUTCOME_MENU}
    words = command_names()
    menus: dict[str, list[tuple[str, str]]] = {}
    for command in (*COMMANDS, *LATER_COMMANDS, *FORM_COMMANDS):
        keys = actions[command.key].shortcut().toString(QKeySequence.SequenceFormat.NativeText)
        menu = names[command.menu].replace("&", "")
        menus.setdefault(menu, []).append((keys, words[command.key].replace("&", "")))
    return menus
