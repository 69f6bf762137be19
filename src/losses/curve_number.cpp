#include "rainledger/losses/curve_number.hpp"
