#pragma once

#include <map>
#include <optional>
#include <string>
#include <vector>

#include "published/inputs.hpp"
#include "published/value_row.hpp"

// The files of published checks. Layout:
//
//   sources: {KEY: "authors, title, year", ...}   every key is used by a check
//   storms:  {NAME: {scenario: TEXT, through_program: true}, ...}   optional
//   checks:
//     - id: unique over all files
//       source: KEY
//       place: table, example or page
//       status: confirmed | from memory | derived
//       operation: one of operations.cpp, with `inputs`; or `storm`, with `storm`, `quantity` and,
//                  for some of the steps only, `at` (the ends of those steps)
//       expected: the printed digits and their unit, "2.68 4.82 in"
//       reproduces: yes (when left out) | rounding | no; the last two with `why` and `exact`
//       as_rounded: {operation, inputs}, the source's own route, for `rounding`
//       note: what a reader should know, optional
namespace rainledger::published {

enum class Reproduces {
    yes,
    rounding,  ///< only when the source's own intermediate rounding is followed
    no,
};

/// What is computed: a library function, or one quantity of a storm's ledger.
struct Computation {
    std::string operation;
    Inputs inputs;
    std::string storm;
    std::string quantity;
    std::optional<ValueRow> at;
};

struct Check {
    std::string id;
    std::string source;
    std::string place;
    std::string status;
    Computation computation;
    ValueRow expected;
    Reproduces reproduces = Reproduces::yes;
    std::string why;
    std::optional<ValueRow> exact;
    std::optional<Computation> as_rounded;
    std::string note;
};

/// A storm over one surface: a scenario as a user would write it.
struct StoredStorm {
    std::string scenario;
    bool through_program = false;
};

struct CheckFile {
    std::string name;
    std::map<std::string, std::string> sources;
    std::map<std::string, StoredStorm> storms;
    std::vector<Check> checks;
};

/// Reads the checks in `text`; `name` is for messages. Throws std::runtime_error when the file has
/// no checks, an unknown or unused key, an unknown operation, an unused source or storm.
[[nodiscard]] CheckFile read_check_file(const std::string& name, const std::string& text);

}  // namespace rainledger::published
