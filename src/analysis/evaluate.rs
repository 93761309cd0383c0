//! From plain inputs to the outcome: joins section, resistance, heating and protection for one member.
