"""What each command of the view does: text size, light or dark, how the picture is drawn, windows beside this one."""

from __future__ import annotations

from typing import TYPE_CHECKING

from PySide6.QtCore import QObject
from PySide6.QtGui import QAction

from fourcount.face import actions as commands_table
from fourcount.face import dialogs

if TYPE_CHECKING:
    from fourcount.face.window import MainWindow


class ViewCommands(QObject):
    """The slots of one window's view; none of them changes the record."""

    def __init__(self, window: MainWindow) -> None:
        super().__init__(window)
        self._window = window
        self._arrangement = window.patient.options.arrangement

    def bigger(self) -> None:
        """One step larger text."""
        self._window.look.step_zoom(1)

    def smaller(self) -> None:
        """One step smaller text."""
        self._window.look.step_zoom(-1)

    def actual(self) -> None:
        """Text at its normal size."""
        self._window.look.set_zoom(1.0)

    def take_appearance(self, action: QAction) -> None:
        """Light, dark, or as the system."""
        self._window.look.set_appearance(action.data())

    def more(self, checked: bool) -> None:
        """Show or hide the measures under the fold, and bring what is new into view."""
        new = self._window.says.set_more(checked)
        if new:
            self._window.page_scroll.bring(*new)

    def methods(self) -> None:
        """Open the methods and sources."""
        dialogs.methods_window(self._window.look, self._window).show()

    def keys(self) -> None:
        """Open the table of keys."""
        shown = commands_table.shortcut_table(self._window.actions_by_key)
        dialogs.keys_window(self._window.look, self._window, shown).show()

    def about(self) -> None:
        """Open what the program is and is not."""
        dialogs.about_window(self._window.look, self._window).show()

    def bars(self, checked: bool) -> None:
        """Draw bars instead of people, or people again."""
        self._draw(arrangement="bars" if checked else self._arrangement)

    def uncertainty(self, checked: bool) -> None:
        """Draw the interval into the picture, or leave it out."""
        self._draw(uncertainty=checked)

    def relative(self, checked: bool) -> None:
        """Draw what the relative figure sounds like beside what it is in people, or leave it out."""
        self._draw(relative=checked)

    def take_icons(self, action: QAction) -> None:
        """Draw people as figures, blocks or dots."""
        self._draw(icons=action.data())

    def take_arrangement(self, action: QAction) -> None:
        """Draw two pictures side by side, or one of all three states; bars end."""
        self._arrangement = action.data()
        self._window.actions_by_key["bars"].setChecked(False)
        self._draw(arrangement=self._arrangement)

    def show_patient(self) -> None:
        """Show the patient's view on the whole screen."""
        from fourcount.face.patient_screen import open_screen

        open_screen(self._window)

    def handout(self) -> None:
        """Show the page for the patient before it is printed or saved."""
        from fourcount.face.handout_window import open_handout

        open_handout(self._window)

    def curve(self) -> None:
        """Show the effect across starting risks."""
        from fourcount.face.curve_window import open_curve

        open_curve(self._window)

    @property
    def kept(self) -> dict[str, str]:
        """What of the drawing the next start remembers: icons and arrangement, never what is shown on demand."""
        return {"icons": self._window.patient.options.icons, "arrangement": self._arrangement}

    def _draw(self, **asked: object) -> None:
        patient = self._window.patient
        patient.set_options(patient.options._replace(**asked))  # type: ignore[arg-type]
