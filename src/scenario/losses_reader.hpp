#pragma once

#include <optional>
#include <string>

#include "rainledger/ledger/surface.hpp"
#include "scenario/yaml.hpp"

// The losses of one surface: the word `impervious`, or a map with one law.
namespace rainledger {

struct ReadLosses {
    Losses losses = Impervious{};
    YAML::Mark law;                ///< the law's word
    YAML::Mark observed_excess;    ///< of a phi index
    bool is_curve_number = false;  ///< by its word, even where its parameters are wrong
};

/// Reads the value of `losses` of `surface` ("surface 'verge'").
[[nodiscard]] ReadLosses read_losses(const Reading& reading, const Entry& entry,
                                     const std::string& surface);

/// Reads the parameters of one law under its name; nothing where something was wrong.
[[nodiscard]] std::optional<Losses> read_law(const Reading& reading, const Entry& law);
[[nodiscard]] std::optional<Losses> read_curve_number(const ClosedMap& map);

}  // namespace rainledger
