#pragma once

#include <optional>
#include <string>
#include <vector>

#include "rainledger/scenario/scenario.hpp"
#include "scenario/yaml.hpp"

// The storms of a scenario: hyetograph files, steps written out, designs and events of a record.
namespace rainledger {

/// The storms under `storm` or `storms` of the scenario's top level. Where something in one was
/// wrong, and reported, its rain may be empty.
[[nodiscard]] std::vector<Storm> read_storms(const ClosedMap& scenario);

/// The rain of `steps: {...}`.
[[nodiscard]] std::optional<Hyetograph> read_steps(const Reading& reading, const Entry& entry);

/// The rain of `hyetograph: ...`; its file is noted in `storm`.
[[nodiscard]] std::optional<Hyetograph> read_hyetograph(const Reading& reading, const Entry& entry,
                                                        Storm& storm);

/// The rain of `design: {...}`; its origin and files are noted in `storm`.
[[nodiscard]] std::optional<Hyetograph> read_design(const Reading& reading, const Entry& entry,
                                                    Storm& storm);

/// The rain of `record: {...}`; its origin and files are noted in `storm`.
[[nodiscard]] std::optional<Hyetograph> read_event(const Reading& reading, const Entry& entry,
                                                   Storm& storm);

/// The storms of `from_record: {...}`.
[[nodiscard]] std::vector<Storm> read_from_record(const Reading& reading, const Entry& entry);

/// The length of a step in h: above zero, and 1 ms or more.
[[nodiscard]] std::optional<double> read_step_length(const Reading& reading, const Entry& entry);

}  // namespace rainledger
