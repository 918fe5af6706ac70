"""Numbers from numbers. A change of any figure the program gives is a change in this folder."""
