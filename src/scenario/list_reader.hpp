#pragma once

#include <cstddef>
#include <optional>
#include <string>
#include <vector>

#include "scenario/yaml.hpp"

// Lists of values of one kind.
namespace rainledger {

inline constexpr std::size_t kMostListed = 20;  // errors told of one list; the rest is not read

/// Reads every entry of a list with `read_one`, which returns an optional Value; nothing if any is
/// wrong, or there are none. A long list of errors is cut short. `example` says how to write the
/// list.
template <class Value, class ReadOne>
std::optional<std::vector<Value>> read_list(const Reading& reading, const Entry& list,
                                            const std::string& example, ReadOne read_one) {
    if (!is_list(reading, list, "a list", example)) return std::nullopt;
    std::vector<Value> values;
    values.reserve(list.value.size());
    std::size_t wrong = 0;
    std::size_t position = 0;
    for (const auto& node : list.value) {
        ++position;
        const YAML::Mark mark = node.Mark().is_null() ? list.mark() : node.Mark();
        const auto value =
            read_one(Entry{list.key + ", entry " + std::to_string(position), mark, node});
        if (value)
            values.push_back(*value);
        else if (++wrong == kMostListed)
            break;
    }
    if (wrong == kMostListed)
        reading.error(list.key_mark,
                      "too many errors in '" + list.key + "'; the rest of it is not read");
    if (wrong > 0) return std::nullopt;
    if (values.empty()) {
        reading.error(list.mark(), "'" + list.key + "' holds no entries", example);
        return std::nullopt;
    }
    return values;
}

}  // namespace rainledger
