#pragma once

#include <optional>
#include <string>
#include <utility>

// What a lookup gives back when it may not have an answer.
namespace rainledger {

/// A value, or what is wrong with the question and what to ask instead.
template <typename T>
struct Answer {
    std::optional<T> value;
    std::string problem = {};  ///< one line without a full stop; empty when there is a value
    std::string hint = {};     ///< may be empty
};

/// An answer that is none.
template <typename T>
[[nodiscard]] Answer<T> refusal(std::string problem, std::string hint = {}) {
    return {std::nullopt, std::move(problem), std::move(hint)};
}

}  // namespace rainledger
