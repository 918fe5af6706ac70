"""All painting: icons, strips and pictures, for screen and for paper."""
