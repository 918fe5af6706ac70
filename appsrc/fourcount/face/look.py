"""How everything looks at this moment: the palette in use, the size of text, and the fonts by role."""

from __future__ import annotations

from PySide6.QtCore import QObject, Qt, Signal
from PySide6.QtGui import QColor, QFont, QFontInfo, QGuiApplication, QPalette, QStyleHints

from fourcount.ink.palette import DARK, HIGH_DARK, HIGH_LIGHT, LIGHT, Palette
from fourcount.ink.style import Role

SIZES: dict[Role, int] = {
    "body": 13,
    "small": 12,
    "head": 11,
    "sentence": 18,
    "cell": 19,
    "estimate": 17,
    "figure": 20,
    "strong": 13,
    "total": 15,
}
"""Text sizes in pixels at 100%."""

SEMIBOLD: tuple[Role, ...] = ("head", "estimate", "figure", "strong")
ZOOMS = (0.8, 0.9, 1.0, 1.1, 1.25, 1.5, 1.75, 2.0)
"""The steps of the text size."""

APPEARANCES = ("system", "light", "dark", "high-light", "high-dark")


class Look(QObject):
    """The palette and the text size, shared by every widget of the window.

    **Signals**
        changed: the palette or the text size is another one; repaint, and measure again.
    """

    changed = Signal()

    def __init__(self, zoom: float = 1.0, appearance: str = "system", parent: QObject | None = None) -> None:
        super().__init__(parent)
        self.zoom = zoom
        self.appearance = appearance
        self.palette: Palette = LIGHT
        self._fonts: dict[Role, QFont] = {}
        self._text_palettes: dict[str, QPalette] = {}
        hints = QGuiApplication.styleHints()
        if appearance != "system":
            self.set_appearance(appearance)
        self._take_scheme()
        hints.colorSchemeChanged.connect(self._on_scheme_changed)
        if hasattr(hints, "accessibility"):
            hints.accessibility().contrastPreferenceChanged.connect(self._on_scheme_changed)

    def px(self, pixels: float) -> int:
        """A length that grows with the text, in logical pixels."""
        return round(pixels * self.zoom)

    def colour(self, part: str) -> QColor:
        """The colour of a part of the palette, by its field name."""
        return QColor(getattr(self.palette, part))

    def font(self, role: Role) -> QFont:
        """The system's font in the size and weight of a role, with figures that stand in columns."""
        if role not in self._fonts:
            font = QFont(QGuiApplication.font())
            font.setPixelSize(max(round(SIZES[role] * self.zoom), 8))
            font.setWeight(QFont.Weight.DemiBold if role in SEMIBOLD else QFont.Weight.Normal)
            font.setFeature(QFont.Tag("tnum"), 1)
            if role == "head":
                font.setCapitalization(QFont.Capitalization.AllUppercase)
                font.setLetterSpacing(QFont.SpacingType.AbsoluteSpacing, 1.1 * self.zoom)
            self._fonts[role] = font
        return self._fonts[role]

    def qt_palette(self) -> QPalette:
        """The palette as Qt's own widgets (menus, scroll bars, dialogs) take it."""
        result = QPalette()
        roles = QPalette.ColorRole
        parts = {
            roles.Window: "page", roles.Base: "page", roles.AlternateBase: "tint", roles.Button: "page",
            roles.ToolTipBase: "tint", roles.WindowText: "ink", roles.Text: "ink", roles.ButtonText: "ink",
            roles.ToolTipText: "ink", roles.PlaceholderText: "muted", roles.Highlight: "accent",
            roles.HighlightedText: "on_accent", roles.Link: "accent", roles.LinkVisited: "accent",
            roles.Mid: "hairline", roles.Midlight: "hairline", roles.Light: "page", roles.Dark: "outline",
            roles.Shadow: "hairline",
        }  # fmt: skip
        for role, part in parts.items():
            result.setColor(role, self.colour(part))
        disabled = QPalette.ColorGroup.Disabled
        for role in (roles.WindowText, roles.Text, roles.ButtonText):
            result.setColor(disabled, role, self.colour("muted"))
        return result

    def text_palette(self, part: str) -> QPalette:
        """Qt's palette with plain text in one colour of ours."""
        if part not in self._text_palettes:
            palette = self.qt_palette()
            palette.setColor(QPalette.ColorRole.WindowText, self.colour(part))
            self._text_palettes[part] = palette
        return self._text_palettes[part]

    def set_zoom(self, zoom: float) -> None:
        """Take another text size, as a factor from 0.8 to 2."""
        if zoom != self.zoom:
            self.zoom = zoom
            self._fonts.clear()
            self.changed.emit()

    def step_zoom(self, direction: int) -> None:
        """Go one step up or down in the text sizes, staying inside them."""
        nearest = min(range(len(ZOOMS)), key=lambda i: abs(ZOOMS[i] - self.zoom))
        self.set_zoom(ZOOMS[min(max(nearest + direction, 0), len(ZOOMS) - 1)])

    def set_appearance(self, appearance: str) -> None:
        """Follow the system, or stay light or dark, with the usual contrast or a higher one."""
        self.appearance = appearance
        scheme = {"light": Qt.ColorScheme.Light, "dark": Qt.ColorScheme.Dark}
        asked = scheme.get(appearance.removeprefix("high-"), Qt.ColorScheme.Unknown)
        QGuiApplication.styleHints().setColorScheme(asked)
        self._on_scheme_changed()

    def _on_scheme_changed(self) -> None:
        before = self.palette
        self._take_scheme()
        if self.palette is not before:
            self.changed.emit()

    def _take_scheme(self) -> None:
        hints = QGuiApplication.styleHints()
        system = self.appearance == "system"
        dark = self.appearance.endswith("dark") or (system and hints.colorScheme() == Qt.ColorScheme.Dark)
        high = self.appearance.startswith("high-") or (system and _wants_contrast(hints))
        self.palette = (HIGH_DARK if dark else HIGH_LIGHT) if high else (DARK if dark else LIGHT)
        self._text_palettes.clear()


def _wants_contrast(hints: QStyleHints) -> bool:
    """Whether the system asks for a higher contrast; Qt knows from 6.10 on."""
    if not hasattr(hints, "accessibility"):
        return False
    return bool(hints.accessibility().contrastPreference() == Qt.ContrastPreference.HighContrast)


def family_in_use() -> str:
    """The name of the font family that the system gave."""
    return QFontInfo(QGuiApplication.font()).family()
