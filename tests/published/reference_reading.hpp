#pragma once

#include <cstddef>
#include <optional>
#include <span>
#include <stdexcept>
#include <string>

#include "published/inputs.hpp"
#include "rainledger/reference/answer.hpp"

// What the operations on published tables share: rows by number, and values that must be there.
namespace rainledger::published {

template <typename T>
[[nodiscard]] T wanted(const std::optional<T>& value, const char* what) {
    if (!value) throw std::runtime_error(std::string("there is no ") + what);
    return *value;
}

template <typename T>
[[nodiscard]] T answered(Answer<T> answer) {
    if (!answer.value) throw std::runtime_error(answer.problem);
    return *answer.value;
}

template <typename Row>
[[nodiscard]] const Row& row_at(std::span<const Row> rows, double number) {
    const auto at = static_cast<std::size_t>(number);
    if (at < 1 || at > rows.size()) throw std::runtime_error("there is no such row");
    return rows[at - 1];
}

template <typename Enum>
[[nodiscard]] Enum counted(Inputs& in, const std::string& name, std::size_t i) {
    return static_cast<Enum>(static_cast<int>(in.number(name, i)) - 1);
}

template <typename Enum>
[[nodiscard]] double count_of(Enum value) {
    return static_cast<double>(value) + 1.0;
}

}  // namespace rainledger::published
