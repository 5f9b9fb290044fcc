//! Rules cited by the choices; filled below.
