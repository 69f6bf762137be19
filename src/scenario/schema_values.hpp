#pragma once

#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include <nlohmann/json.hpp>

#include "rainledger/base/quantity.hpp"
#include "scenario/words.hpp"

// The building blocks of the JSON Schema: values and closed maps.
namespace rainledger {

using Json = nlohmann::ordered_json;

/// A map with these keys alone. `more` is merged in.
[[nodiscard]] Json closed(const std::vector<std::pair<std::string, Json>>& properties,
                          const std::vector<std::string>& required,
                          const Json& more = Json::object());

/// Exactly one of the keys.
[[nodiscard]] Json one_required(const std::vector<std::string>& keys);

[[nodiscard]] Json any_of(const std::vector<Json>& choices);
[[nodiscard]] Json reference(const std::string& definition);
[[nodiscard]] Json described(Json value, std::string_view description);

/// A number with a unit of the dimension, zero or more; the units are added to the description.
[[nodiscard]] Json quantity(Dimension dimension, std::string_view description);
/// Plain text; an editor may take it for a number or a truth value.
[[nodiscard]] Json text();
/// Plain text without characters that are not shown, nor those of `refused`.
[[nodiscard]] Json shown_text(std::string_view refused = {});
/// What the names of a map look like: no blank text, and the same characters left out.
[[nodiscard]] Json name(std::string_view refused);
[[nodiscard]] Json words(Words choices);
/// A number within limits ("minimum" and the like), or one in quotes.
[[nodiscard]] Json number(const Json& limits);
[[nodiscard]] Json at_least_zero();
[[nodiscard]] Json fraction();
/// A share above 0 and up to 1, or a percentage.
[[nodiscard]] Json share();

}  // namespace rainledger
